import { aboutStudy } from '#shared/study/about-study';
import type { DraftDocument } from '#shared/study/draft';
import type { Intonation } from '#shared/study/study.document';
import type { BassKind } from '#shared/strings/sections';

const INTONATIONS: Readonly<Record<Intonation, string>> = {
  equal: 'equal temperament',
  pure: 'pure intonation',
  pythagorean: 'Pythagorean intonation',
};
const BASSES: Readonly<Record<BassKind, string>> = {
  'four-string': 'basses with four strings',
  extension: 'basses with the low extension',
  'five-string': 'basses with five strings',
};

/** @returns what the figures of a study stand under: key, tuning, players, metre and tempo */
export function settingsLine(study: DraftDocument): string {
  const { metre, tempoBpm, intonation, ensemble } = study;
  return [
    `${aboutStudy({ ...study, about: '' })} players from the first violins down`,
    ...[INTONATIONS[intonation], BASSES[ensemble.bass]],
    ...[`${metre.beats}/${metre.unit}`, `${tempoBpm} beats a minute`],
  ].join(' · ');
}
