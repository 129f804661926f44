import { erbRate } from '#shared/hearing/erb';
import { displayPitch, type NoteNaming } from '#shared/pitch/display';
import type { Hertz } from '#shared/units';
import type { Partial, VoiceSound } from '#shared/voicing/analysis';
import { heardNumbers } from '#shared/voicing/heard';
import { hertzText, possessive, sentence } from '#shared/voicing/words';

/** A partial of one note close to a partial of another. */
export interface SeriesMeeting {
  /** Of the note that is asked about. */
  readonly n: number;
  readonly frequencyHz: Hertz;
  readonly otherId: string;
  readonly otherN: number;
  readonly otherHz: Hertz;
  readonly differenceHz: Hertz;
}

/** Two partials nearer than one equivalent rectangular bandwidth are not heard apart. */
const MEET_WITHIN = 1;
/** As many as a reader can take in at once. */
const MOST_MEETINGS = 8;
/** Nearer than this they are one: a listener takes a second and more to hear them come and go. */
const TOGETHER_HZ: Hertz = 0.5;

interface Weighed extends SeriesMeeting {
  readonly weight: number;
}

/**
 * Which heard partials of one note meet heard partials of the others, within one band of hearing.
 * @param voices of the chord, as they sound
 * @param id the note that is asked about
 * @returns the strongest, in the order of the note's own partials
 * @source Glasberg & Moore 1990 for the width of a band
 * @example seriesMeetings([A2, E3], 'A2')[0] // partial 3 and partial 2 near 330 Hz
 */
export function seriesMeetings(voices: readonly VoiceSound[], id: string): readonly SeriesMeeting[] {
  const own = voices.find((voice) => voice.id === id);
  if (!own) return [];
  const heard = heardNumbers(voices);
  const audible = (voice: VoiceSound): readonly Partial[] =>
    voice.partials.filter(({ n }) => heard.get(voice.id)?.has(n));
  const others = voices.filter((voice) => voice !== own);
  const found = audible(own).flatMap((partial) =>
    others.flatMap((other) => audible(other).flatMap((theirs) => meetingOf(partial, theirs, other.id))),
  );
  return found
    .sort((a, b) => b.weight - a.weight)
    .slice(0, MOST_MEETINGS)
    .sort((a, b) => a.n - b.n || a.otherHz - b.otherHz)
    .map(({ weight: _weight, ...meeting }) => meeting);
}

function meetingOf(own: Partial, theirs: Partial, otherId: string): readonly Weighed[] {
  const apart = Math.abs(erbRate(own.frequencyHz) - erbRate(theirs.frequencyHz));
  if (apart > MEET_WITHIN) return [];
  return [
    {
      ...{ n: own.n, frequencyHz: own.frequencyHz, otherId, otherN: theirs.n, otherHz: theirs.frequencyHz },
      differenceHz: Math.abs(own.frequencyHz - theirs.frequencyHz),
      weight: own.levelDb + theirs.levelDb,
    },
  ];
}

/** @returns how far apart two partials stand, short: `13 Hz`, or `together` */
export function apartText(differenceHz: Hertz): string {
  return differenceHz < TOGETHER_HZ ? 'together' : hertzText(differenceHz);
}

/**
 * A note's series and what of it meets others, in words.
 * @example seriesText(voices, 'note-1', 'english')[0] // 'Partial 3, 330 Hz, meets partial 2 of the violas’ E3, 0.4 Hz apart.'
 */
export function seriesText(voices: readonly VoiceSound[], id: string, naming: NoteNaming): readonly string[] {
  const byId = new Map(voices.map((voice) => [voice.id, voice]));
  return seriesMeetings(voices, id).flatMap(({ n, frequencyHz, otherId, otherN, differenceHz }) => {
    const other = byId.get(otherId);
    if (!other) return [];
    const [one, two] = [partialName(n), partialName(otherN)];
    const whose = `${possessive(other.section, other.players)} ${displayPitch(other.pitch, naming)}`;
    const apart = differenceHz < TOGETHER_HZ ? 'together' : `${hertzText(differenceHz)} apart`;
    return [sentence(`${one}, ${hertzText(frequencyHz)}, meets ${two} of ${whose}, ${apart}.`)];
  });
}

function partialName(n: number): string {
  return n === 1 ? 'the fundamental' : `partial ${n}`;
}
