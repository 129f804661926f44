import { beforeEach, describe, expect, test } from 'vitest';
import { MOST_PAIRS_TOLD } from '#shared/contracts/analysis';
import { COMMON_PRACTICE_ORDERINGS } from '#shared/data/common-practice-orderings';
import { SCORE_CHORDS } from '#shared/data/score-chords';
import { REGISTERS } from '#shared/voicing/registers';
import { createTestApp, type TestApp } from '../support/app';
import { keyName } from '../support/voicings';
import { analysisOf, call, faultPaths } from '../support/scripts';

let at: TestApp;
beforeEach(async () => {
  at = await createTestApp();
});

const analyse = (body: object) => call(at, '/api/analysis', body);
const CELLO_C2 = { section: 'cello', pitch: 'C2' };

describe('what is answered', () => {
  test('when a low third is analysed, then every part of the answer is there and tells of it', async () => {
    const answer = await analysisOf(at, 'C2 E2 G3');
    expect(Object.keys(answer)).toEqual([
      'muddiness',
      'roughness',
      'limits',
      'density',
      'balance',
      'character',
      'explanation',
      'partials',
    ]);
    // The chart's limit of the major third is Bb2, Lowell & Pullig 2003; C2 lies ten semitones under it.
    expect(answer.limits).toEqual([
      { lower: 'C2', upper: 'E2', interval: 'M3', limit: 'Bb2', semitonesBelow: 10 },
    ]);
    expect(answer.muddiness.registers.map(({ name }) => name)).toEqual(REGISTERS);
    const indices = answer.muddiness.registers.map(({ index }) => index);
    expect(answer.muddiness.index).toBe(Math.max(...indices));
    expect(answer.muddiness.index).toBeGreaterThan(50);
    expect(answer.muddiness.uncertainty).toBeGreaterThan(0);
    expect(answer.balance.voices.map(({ voice, players }) => [voice, players])).toEqual([
      [0, 8],
      [1, 8],
      [2, 8],
    ]);
    expect(answer.balance.tones.map(({ tone, voices }) => [tone, voices])).toEqual([
      ['C', [0]],
      ['E', [1]],
      ['G', [2]],
    ]);
    // C major in root position: Parncutt 1988 takes C for its root. C2 to G3 is a twelfth, 19 semitones.
    expect(answer.character.root?.root).toBe(0);
    expect(answer.character.spread).toBe(19);
  });

  test('when partials are told, then they are the harmonic series of their voices', async () => {
    const { partials } = await analysisOf(at, 'A2 A3');
    for (const { voice, n, frequencyHz } of partials) {
      // ISO 16:1975: A4 is 440 Hz, so A2 is 110 and A3 220.
      expect(frequencyHz).toBeCloseTo((voice === 0 ? 110 : 220) * n, 6);
    }
    expect(new Set(partials.map(({ voice }) => voice))).toEqual(new Set([0, 1]));
  });

  test('when a register clouds, then the shares of its pairs add up to one, and the cloudiest has the low third first', async () => {
    const { explanation, muddiness } = await analysisOf(at, 'C2 E2 G3');
    for (const { pairs } of explanation.registers) {
      expect(pairs.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
    }
    const clouded = muddiness.registers.filter(({ index }) => index > 0).map(({ name }) => name);
    expect(explanation.registers.map(({ name }) => name)).toEqual(clouded);
    const cloudiest = muddiness.registers.find(({ index }) => index === muddiness.index)?.name;
    const [first] = explanation.registers.find(({ name }) => name === cloudiest)?.pairs ?? [];
    expect(first).toMatchObject({ lower: 'C2', upper: 'E2', lowerVoice: 0, upperVoice: 1 });
    for (const { before, after } of explanation.moves) {
      expect(before).toBe(muddiness.index);
      expect(after).toBeLessThan(before);
    }
    expect(explanation.moves.length).toBeGreaterThan(0);
  });

  test.each(COMMON_PRACTICE_ORDERINGS.map(({ muddier, clearer, why }) => [why, muddier, clearer] as const))(
    'when two voicings differ by %s, then the one that arrangers take for muddier is',
    async (_why, muddier, clearer) => {
      const more = await analysisOf(at, muddier.join(' '));
      const less = await analysisOf(at, clearer.join(' '));
      expect(more.muddiness.index).toBeGreaterThan(less.muddiness.index);
    },
  );

  test('when five parts stand close and low, then they are muddier than open: the pairs under their limits say why', async () => {
    const open = await analysisOf(at, 'D2 A2 F3 D4 A4');
    const close = await analysisOf(at, 'D2 F2 A2 D3 A3');
    expect(open.muddiness.index).toBeLessThan(close.muddiness.index);
    expect(open.limits).toEqual([]);
    // Lowell & Pullig 2003: m3 from C3, M3 from Bb2; M6 F2–D3 stands at its limit F2 and is none of them.
    expect(close.limits).toEqual([
      { lower: 'D2', upper: 'F2', interval: 'm3', limit: 'C3', semitonesBelow: 10 },
      { lower: 'F2', upper: 'A2', interval: 'M3', limit: 'Bb2', semitonesBelow: 5 },
      { lower: 'A2', upper: 'D3', interval: 'P4', limit: 'Bb2', semitonesBelow: 1 },
    ]);
  });

  test.each(SCORE_CHORDS.map(({ id, composer, work, parts }) => [composer, work, id, parts] as const))(
    'when a chord of %s, %s (%s) is sent, then no pair of it is accused',
    async (_composer, _work, _id, parts) => {
      const voices = parts.flatMap(([section, pitches]) => pitches.map((pitch) => ({ section, pitch })));
      const answer = await analyse({ voices });
      expect([answer.status, answer.body.limits]).toEqual([200, []]);
    },
  );

  test('when forty voices are sent, then all are analysed, and of each register at most so many pairs are told', async () => {
    const voices = Array.from({ length: 40 }, (_, i) => ({ section: 'cello', pitch: keyName(36 + i) }));
    const answer = await analyse({ voices });
    expect(answer.status).toBe(200);
    expect(answer.body.balance.voices).toHaveLength(40);
    for (const { pairs } of answer.body.explanation.registers) {
      expect(pairs.length).toBeLessThanOrEqual(MOST_PAIRS_TOLD);
    }
  });
});

describe('what changes the answer', () => {
  const pair = [
    { section: 'cello', pitch: 'C3' },
    { section: 'viola', pitch: 'E3' },
  ];

  test('when nothing is said of them, then A4, intonation, players and dynamic are the usual ones', async () => {
    const usual = {
      a4Hz: 440,
      intonation: 'equal',
      ensemble: {
        players: { violin1: 14, violin2: 12, viola: 10, cello: 8, doubleBass: 6 },
        bass: 'four-string',
      },
    };
    const said = await analyse({ ...usual, voices: pair.map((voice) => ({ ...voice, dynamic: 'mf' })) });
    expect((await analyse({ voices: pair })).body).toEqual(said.body);
  });

  test.each([
    ['equal', 2 ** (4 / 12)],
    ['pure', 5 / 4],
    ['pythagorean', 81 / 64],
  ])('when the intonation is %s, then the third has its ratio', async (intonation, ratio) => {
    const { body } = await analyse({ intonation, a4Hz: 415, voices: pair });
    const fundamentals = body.partials.filter(({ n }: { n: number }) => n === 1);
    expect(fundamentals[1].frequencyHz / fundamentals[0].frequencyHz).toBeCloseTo(ratio, 9);
  });

  test('when a section divides, then its players are shared; on a double stop all play both notes', async () => {
    const divided = [CELLO_C2, { section: 'cello', pitch: 'G2' }];
    const playersIn = async (voices: object[]) =>
      (await analyse({ voices })).body.balance.voices.map(({ players }: { players: number }) => players);
    expect(await playersIn(divided)).toEqual([4, 4]);
    expect(await playersIn(divided.map((voice) => ({ ...voice, stop: 1 })))).toEqual([8, 8]);
  });

  test('when a voice plays softly beside a loud one in its register, then it is covered', async () => {
    const { body } = await analyse({
      voices: [
        { section: 'cello', pitch: 'C3', dynamic: 'fff', players: 30 },
        { section: 'viola', pitch: 'C3', dynamic: 'ppp', players: 1 },
      ],
    });
    expect(body.balance.voices.map(({ covered }: { covered: boolean }) => covered)).toEqual([false, true]);
  });
});

describe('what is refused', () => {
  test('when a chord is empty, then a sentence says what it needs', async () => {
    const answer = await analyse({ voices: [] });
    expect([answer.status, answer.body.error.code]).toEqual([422, 'input.invalid']);
    expect(answer.body.error.details).toEqual([
      { path: 'body.voices', message: 'a chord needs at least one voice' },
    ]);
  });

  test.each([
    ['a chord of 41 voices', { voices: Array.from({ length: 41 }, () => CELLO_C2) }, ['body.voices']],
    [
      'notes that are none',
      { voices: ['H2', 'c2', 'C', 'Cx4', 'E#b3', '', 'C2 '].map((pitch) => ({ ...CELLO_C2, pitch })) },
      [0, 1, 2, 3, 4, 5, 6].map((i) => `body.voices.${i}.pitch`),
    ],
    [
      'octaves that nobody plays',
      { voices: ['C9', 'C-1', 'C10'].map((pitch) => ({ ...CELLO_C2, pitch })) },
      [0, 1, 2].map((i) => `body.voices.${i}.pitch`),
    ],
    [
      'an unknown section and technique',
      { voices: [{ section: 'harp', pitch: 'C2', technique: { stroke: 'col legno' }, dynamic: 'sfz' }] },
      ['body.voices.0.dynamic', 'body.voices.0.section', 'body.voices.0.technique.stroke'],
    ],
    [
      'figures out of bounds',
      { a4Hz: 467, voices: [{ ...CELLO_C2, players: 61, stop: 0 }] },
      ['body.a4Hz', 'body.voices.0.players', 'body.voices.0.stop'],
    ],
    ['a name that is none of ours', { voices: [{ ...CELLO_C2, loud: true }] }, ['body.voices.0']],
    ['nothing', {}, ['body.voices']],
  ])('when %s is sent, then each fault is named by its path', async (_what, body, paths) => {
    const answer = await analyse(body);
    expect([answer.status, answer.body.error.code]).toEqual([422, 'input.invalid']);
    expect(faultPaths(answer)).toEqual(paths);
  });
});

test('when pitches and levels lie at their ends, then the figures stay finite', async () => {
  const technique = { contact: 'sulPonticello', mute: true, stroke: 'pizzicato', harmonic: 'artificial' };
  const answer = await analyse({
    a4Hz: 466,
    intonation: 'pythagorean',
    voices: [
      { section: 'doubleBass', pitch: 'Cbb0', dynamic: 'ppp', players: 1, technique },
      { section: 'violin1', pitch: 'B##8', dynamic: 'fff', players: 60 },
      { section: 'violin1', pitch: 'B##8', dynamic: 'fff', players: 60 },
    ],
  });
  expect(answer.status).toBe(200);
  // JSON has no word for what is not finite: it would stand there as null.
  expect(answer.body.roughness).toEqual({
    hutchinsonKnopoff: expect.any(Number),
    sethares: expect.any(Number),
    vassilakis: expect.any(Number),
  });
});
