import { playersGain } from '#shared/acoustics/level';
import { SECTIONS, SECTION_FACTS, type Section } from '#shared/strings/sections';
import { COMMON_PRACTICE, type Tip, type TipFacts } from '#shared/voicing/tips/tip';
import { possessive, sentence } from '#shared/voicing/words';

const PAIR = 2;
/** Fewer are soloists rather than a divided section. */
const LEAST_DIVIDED = 4;
const COUNTS: Readonly<Record<number, string>> = { 2: 'two', 3: 'three', 4: 'four' };
const STOP = ' A double stop (+) keeps everybody on both notes, where it lies in the hand.';

/** Players on each line of a section: its voices, the notes of a double stop being one line. */
function linesOf(section: Section, { chord, analysis }: TipFacts): readonly number[] {
  const players = new Map(analysis.voices.map((voice) => [voice.id, voice.players]));
  const lines = new Map<string, number>();
  for (const { id, section: its, stop } of chord.voices) {
    const count = players.get(id);
    if (its === section && count !== undefined) lines.set(stop === null ? id : `stop ${stop}`, count);
  }
  return [...lines.values()];
}

/** What a divided section loses. */
export const DIVIDED: Tip = {
  id: 'divided',
  source: 'Players add as 10 lg N (Howard & Angus)',
  says(facts) {
    for (const section of SECTIONS) {
      const lines = linesOf(section, facts);
      const all = lines.reduce((sum, players) => sum + players, 0);
      if (lines.length < 2 || all < LEAST_DIVIDED) continue;
      const loss = playersGain(all) - playersGain(Math.min(...lines));
      const parts = COUNTS[lines.length] ?? String(lines.length);
      return `${sentence(`the ${SECTION_FACTS[section].plural}`)} divided in ${parts}: the thinnest line has ${Math.round(loss)} dB less than all together.${lines.length === PAIR ? STOP : ''}`;
    }
    return null;
  },
};

/** Two on a line. */
export const TWO_PLAYERS: Tip = {
  id: 'two-players',
  source: COMMON_PRACTICE,
  says({ analysis }) {
    const voice = analysis.voices.find(({ players }) => players === PAIR);
    if (!voice) return null;
    return `${sentence(possessive(voice.section, voice.players))} line has two players: the hardest number to tune, since every difference is heard. One alone, or three, is kinder.`;
  },
};
