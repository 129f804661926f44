import { hutchinsonKnopoff1978 } from '#shared/hearing/hutchinson-knopoff-1978';
import type { PartialsMeasure } from '#shared/hearing/partials';
import { sethares1993 } from '#shared/hearing/sethares-1993';
import { vassilakis2001 } from '#shared/hearing/vassilakis-2001';

export const ROUGHNESS_MODELS = ['hutchinson-knopoff', 'sethares', 'vassilakis'] as const;
export type RoughnessModel = (typeof ROUGHNESS_MODELS)[number];

/** The two published variants of Hutchinson & Knopoff, and what each other model was published with. */
export const ROUGHNESS_HARMONICS = { exact: 11, semitone: 10 } as const;

/** The competing models of roughness, each with its source, so that a reader can choose between them. */
export const ROUGHNESS: Readonly<
  Record<RoughnessModel, { readonly measure: PartialsMeasure; readonly source: string }>
> = {
  'hutchinson-knopoff': {
    measure: hutchinsonKnopoff1978,
    source:
      'Hutchinson & Knopoff 1978, Interface 7(1): 1–29, in the analytic form of Bigand, Parncutt & Lerdahl 1996',
  },
  sethares: { measure: (partials) => sethares1993(partials), source: 'Sethares 1993, JASA 94(3): 1218–1228' },
  vassilakis: { measure: vassilakis2001, source: 'Vassilakis 2001, PhD thesis, UCLA, eq. 6.23' },
};
