import { displayPitch, spokenPitch, type NoteNaming } from '#shared/pitch/display';
import { midiOfName } from '#shared/pitch/names';
import type { SpellingKey } from '#shared/pitch/spelling';
import { SECTION_FACTS, SECTIONS, type Section } from '#shared/strings/sections';
import type { Chord, Ensemble, Voice } from '#shared/study/study.document';
import type { ChordAnalysis, VoiceSound } from '#shared/voicing/analysis';
import { reachOf } from '#shared/voicing/reach.sentences';
import { hertzText } from '#shared/voicing/words';
import type { PitchAxis } from '@/charts/pitch-axis';
import { spreadLabels } from '@/charts/spread-labels';
import { tokenColumns, type TokenColumn } from '@/charts/token-columns';

/** A note as it stands in the lanes. */
export interface LaneNote {
  readonly voice: Voice;
  readonly midi: number;
  readonly name: string;
  readonly spoken: string;
  /** Of its fundamental; `null` where it does not sound. */
  readonly frequencyHz: number | null;
  /** It shares its height with others of its lane, and takes less room. */
  readonly tight: boolean;
  readonly beyond: boolean;
  /** Pixels from the top. */
  readonly y: number;
  /** Where its token is drawn: at `y`, or where tokens would cover each other as near to it as can be. */
  readonly shownY: number;
  /** Middle, in per cent of all five lanes. */
  readonly left: number;
}

/** A chord, and what its lanes are drawn by. */
export interface ShownChord {
  readonly chord: Chord;
  readonly analysis: ChordAnalysis;
  readonly ensemble: Ensemble;
  readonly spelling: SpellingKey;
  readonly naming: NoteNaming;
  readonly axis: PitchAxis;
}

/** Height of a token and a little air, in pixels. */
const TOKEN_HEIGHT = 24;
/** From the middle of a token to its edge, in pixels, with a little air: a note and its sign. */
const TOKEN_HALF = 26;
/** The same where notes stand beside each other and take less room. */
const TIGHT_HALF = 23;
/** Width of a note and its sign where they take less room, in pixels. */
const TIGHT_WIDTH = 38;
/** In a lane narrower than this, in pixels, two tokens beside each other would cover each other. */
const NARROW_LANE = 2 * TIGHT_HALF + TIGHT_WIDTH;
const MIDDLE = 1 / 2;
const LANE_PERCENT = 100 / SECTIONS.length;

function fundamental(sound: VoiceSound | undefined): number | null {
  return sound?.partials.find(({ n }) => n === 1)?.frequencyHz ?? null;
}

/** One column stands in the middle of its lane; several reach from edge to edge, and none over it. */
function leftOf(section: Section, { column, columns }: TokenColumn, laneWidth: number): number {
  const half = columns > 1 ? TIGHT_HALF : TOKEN_HALF;
  const edge = laneWidth > 0 ? Math.min(half / laneWidth, MIDDLE) : MIDDLE / 2;
  const across = columns === 1 ? MIDDLE : edge + ((1 - 2 * edge) * column) / (columns - 1);
  return LANE_PERCENT * (SECTIONS.indexOf(section) + across);
}

function spokenOf(voice: Voice, hertz: string, beyond: boolean, naming: NoteNaming): string {
  const parts = [
    `${SECTION_FACTS[voice.section].plural}, ${spokenPitch(voice.pitch, naming)}`,
    hertz,
    voice.locked ? 'locked' : '',
    voice.stop === null ? '' : 'in a double stop',
    voice.link === null ? '' : 'linked',
    beyond ? 'out of reach' : '',
  ];
  return parts.filter((part) => part !== '').join(', ');
}

interface Place extends TokenColumn {
  readonly tight: boolean;
  readonly shownY: number;
}

/** Where the tokens of one lane stand: those too close beside each other, or in a narrow lane over each other. */
function placesIn(own: readonly Voice[], axis: PitchAxis, laneWidth: number): ReadonlyMap<string, Place> {
  const notes = own.map(({ id, pitch }) => ({ id, midi: midiOfName(pitch) }));
  const columns = tokenColumns(notes, TOKEN_HEIGHT / axis.semitone);
  const over = laneWidth > 0 && laneWidth < NARROW_LANE;
  const within = notes.filter(({ midi }) => midi >= axis.low && midi <= axis.high);
  const spread = spreadLabels(
    within.map(({ midi }) => axis.yOf(midi)),
    TOKEN_HEIGHT,
    { top: axis.strip, bottom: axis.height },
  );
  const spreadY = new Map(within.map(({ id }, index) => [id, spread[index]]));
  return new Map(
    notes.map(({ id, midi }): [string, Place] => {
      const { column, columns: all } = columns.get(id) ?? { column: 0, columns: 1 };
      const y = axis.yOf(midi);
      return over
        ? [id, { column: 0, columns: 1, tight: all > 1, shownY: spreadY.get(id) ?? y }]
        : [id, { column, columns: all, tight: all > 1, shownY: y }];
    }),
  );
}

/**
 * Places the notes of a chord in the five lanes, in the chord's own order.
 * @param laneWidth in pixels; 0 while it is not known
 */
export function laneNotes(
  { chord, analysis, ensemble, spelling, naming, axis }: ShownChord,
  laneWidth = 0,
): readonly LaneNote[] {
  const places = new Map<string, Place>();
  for (const section of SECTIONS) {
    const own = chord.voices.filter((voice) => voice.section === section);
    for (const [id, place] of placesIn(own, axis, laneWidth)) places.set(id, place);
  }
  const sounds = new Map(analysis.voices.map((sound) => [sound.id, sound]));
  return chord.voices.map((voice) => {
    const midi = midiOfName(voice.pitch);
    const frequencyHz = fundamental(sounds.get(voice.id));
    const hertz = frequencyHz === null ? '' : hertzText(frequencyHz);
    const y = axis.yOf(midi);
    const place = places.get(voice.id) ?? { column: 0, columns: 1, tight: false, shownY: y };
    const beyond = reachOf(voice, ensemble.bass, spelling, naming).lying === 'beyond';
    return {
      voice,
      midi,
      name: displayPitch(voice.pitch, naming),
      spoken: spokenOf(voice, hertz, beyond, naming),
      frequencyHz,
      tight: place.tight,
      beyond,
      y,
      shownY: place.shownY,
      left: leftOf(voice.section, place, laneWidth),
    };
  });
}
