import { midiOfName } from '#shared/pitch/names';
import type { Section } from '#shared/strings/sections';
import type { Voice } from '#shared/study/study.document';
import type { PitchAxis } from '@/charts/pitch-axis';

/** A head's place in the pane, in pixels. */
export interface PlacedHead {
  readonly voiceId: string;
  readonly left: number;
  readonly right: number;
  readonly y: number;
}

/** From a head to its height on the pitch axis. */
export interface Leader {
  readonly voiceId: string;
  readonly section: Section;
  readonly from: { readonly x: number; readonly y: number };
  readonly to: { readonly x: number; readonly y: number };
  readonly path: string;
}

const BESIDE_HEAD = 3;
/** A leader leaves its head and reaches its height level, by this part of its way. */
const LEVEL = 0.55;

/**
 * The lines that lead from the heads to their heights: level until right of all heads, where no words stand, and
 * there up or down.
 * @param heads of the chord; of an artificial harmonic's two the upper leads to where it sounds
 * @param voices of the chord
 * @param axis of the bench
 * @param end where the leaders end, in pixels
 * @returns a leader for each voice that has a head
 */
export function leadersOf(
  heads: readonly PlacedHead[],
  voices: readonly Pick<Voice, 'id' | 'section' | 'pitch'>[],
  axis: PitchAxis,
  end: number,
): readonly Leader[] {
  const sections = new Map(voices.map(({ id, section }) => [id, section]));
  const rightOf = (own: (head: PlacedHead) => boolean): number =>
    Math.max(0, ...heads.filter(own).map(({ right }) => right)) + BESIDE_HEAD;
  const bend = rightOf(() => true);
  const level = (end - bend) * LEVEL;
  return voices.flatMap(({ id, section, pitch }) => {
    const own = heads.filter(({ voiceId }) => voiceId === id);
    const head = own.reduce<PlacedHead | null>((top, one) => (top && top.y <= one.y ? top : one), null);
    if (!head) return [];
    const from = { x: rightOf(({ voiceId }) => sections.get(voiceId) === section), y: head.y };
    const to = { x: end, y: axis.yOf(midiOfName(pitch)) };
    const curve = `C${bend + level} ${from.y} ${end - level} ${to.y} ${end} ${to.y}`;
    return [{ voiceId: id, section, from, to, path: `M${from.x} ${from.y}L${bend} ${from.y}${curve}` }];
  });
}
