import { effectScope, nextTick } from 'vue';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { chordLevel } from '@/audio/levels';
import { createPlayback } from '@/composables/playback';
import type { Playback } from '@/composables/playback-interface';
import type { SoundEngine } from '@/audio/sound-engine';
import { SECTIONS } from '#shared/strings/sections';
import { SilentEngine } from '../../support/silent-engine';
import { seriesOn, voiceSound } from '../../support/sounds';

const bass = voiceSound('bass-voice', {
  section: 'doubleBass',
  midi: 38,
  partials: seriesOn(73.4, [6, 0, -3]),
});
const third = voiceSound('third-voice', { midi: 41, partials: seriesOn(87.3, [3, -3]) });
const top = voiceSound('top-voice', { section: 'violin1', midi: 69, partials: seriesOn(440, [0]) });
const chord = [bass, third, top];

const scopes = new Set<() => void>();
afterEach(() => {
  scopes.forEach((stop) => stop());
  scopes.clear();
});

function playbackOver(load: () => Promise<SoundEngine>): Playback {
  const scope = effectScope();
  scopes.add(() => scope.stop());
  const playback = scope.run(() => createPlayback(load));
  if (!playback) throw new Error('no playback');
  playback.bring({ sounds: chord, progression: [], tempoBpm: 60 });
  return playback;
}

function readyPlayback(): { playback: Playback; engine: SilentEngine; load: ReturnType<typeof vi.fn> } {
  const engine = new SilentEngine();
  const load = vi.fn(async () => engine);
  return { playback: playbackOver(load), engine, load };
}

describe('playback', () => {
  it('when nothing has been played, then nothing that makes sound is fetched', async () => {
    const { playback, load } = readyPlayback();
    playback.setVolume(-30);
    playback.stop();
    await nextTick();
    expect(load).not.toHaveBeenCalled();
    expect(playback.status.value).toBe('idle');
  });

  it('when the chord is struck, then all its voices begin together, at their common scale and quietly', async () => {
    const { playback, engine } = readyPlayback();
    await playback.strike();
    expect(engine.schedule.map(({ sounds }) => sounds)).toEqual([chord]);
    expect(engine.loudest).toBe(chordLevel(chord));
    expect(engine.volume).toBe(-24);
    expect(playback.mode.value).toBe('strike');
  });

  it('when a held chord changes, then what is held follows', async () => {
    const { playback, engine } = readyPlayback();
    await playback.hold();
    playback.bring({ sounds: [bass, top], progression: [], tempoBpm: 60 });
    await vi.waitFor(() => expect(engine.held).toEqual([bass, top]));
    expect(playback.mode.value).toBe('hold');
  });

  it('when a pair is heard, then only its two notes sound, as strong as in the chord', async () => {
    const { playback, engine } = readyPlayback();
    await playback.hear({ kind: 'pair', lowerId: bass.id, upperId: third.id });
    expect(engine.held).toEqual([bass, third]);
    expect(engine.loudest).toBe(chordLevel(chord));
  });

  it('when the same pair is asked for once more, then it ends and the whole chord is next', async () => {
    const { playback, engine } = readyPlayback();
    const pair = { kind: 'pair', lowerId: bass.id, upperId: third.id } as const;
    await playback.hear(pair);
    await playback.hear({ ...pair });
    expect(engine.state).toBe('silent');
    expect(playback.listening.value).toEqual({ kind: 'chord' });
  });

  it('when a part is heard, then it ends by itself after four seconds, and its sign with it', async () => {
    vi.useFakeTimers();
    const { playback, engine } = readyPlayback();
    await playback.hear({ kind: 'voice', id: third.id });
    expect(playback.heard.value).toEqual({ kind: 'voice', id: third.id });
    expect(playback.mode.value).toBe('listen');
    vi.advanceTimersByTime(3900);
    expect(engine.state).toBe('held');
    vi.advanceTimersByTime(200);
    expect(engine.state).toBe('silent');
    expect(playback.heard.value).toBeNull();
    vi.useRealTimers();
  });

  it('when the chord is held after a part was heard, then it is held until it is stopped', async () => {
    vi.useFakeTimers();
    const { playback, engine } = readyPlayback();
    await playback.hear({ kind: 'voice', id: third.id });
    await playback.hold();
    vi.advanceTimersByTime(60_000);
    expect(engine.state).toBe('held');
    expect(engine.held).toEqual(chord);
    vi.useRealTimers();
  });

  it("when a voice's partials are played in turn, then each sounds alone and is told", async () => {
    const { playback, engine } = readyPlayback();
    await playback.playPartials(bass.id);
    expect(engine.schedule.map(({ sounds }) => sounds[0]?.partials)).toEqual(
      bass.partials.map((partial) => [partial]),
    );
    engine.head = engine.schedule[1]?.key ?? null;
    await vi.waitFor(() => expect(playback.playingPartial.value).toEqual({ voiceId: bass.id, n: 2 }));
    expect(playback.playingChordId.value).toBeNull();
  });

  it('when two chords are compared, then the louder one is taken back, and the other heard at a word', async () => {
    const { playback, engine } = readyPlayback();
    await playback.compareAB([top], [bass, third, top]);
    expect(engine.side).toBe('a');
    expect(engine.compared?.a).toEqual({ sounds: [top], trim: 0 });
    expect(engine.compared?.b.trim).toBeLessThan(0);
    playback.switchTo('b');
    expect(engine.side).toBe('b');
    expect(playback.side.value).toBe('b');
    await playback.compareAB([top], [top]);
    expect(engine.side).toBe('b');
    expect(engine.compared?.b.trim).toBe(0);
  });

  it('when everything is to sound an octave higher, then what is held follows, at the same levels', async () => {
    const { playback, engine } = readyPlayback();
    await playback.hold();
    playback.setOctave(true);
    await vi.waitFor(() => expect(engine.held[2]?.partials).toEqual(seriesOn(880, [0])));
    expect(engine.loudest).toBe(chordLevel(chord));
    playback.setOctave(false);
    await vi.waitFor(() => expect(engine.held).toEqual(chord));
  });

  it('when the room is switched off, then the engine is told, and a new page remembers it', async () => {
    const { playback, engine } = readyPlayback();
    await playback.hold();
    playback.setRoom(false);
    await vi.waitFor(() => expect(engine.room).toBe(false));
    expect(readyPlayback().playback.room.value).toBe(false);
    playback.setRoom(true);
  });

  it('when a chord has stood still and the engine is there, then its sound is made ready', async () => {
    const { playback, engine } = readyPlayback();
    await playback.strike();
    playback.bring({ sounds: [bass, top], progression: [], tempoBpm: 60 });
    await vi.waitFor(() => expect(engine.ready).toEqual([bass, top]));
  });

  it('when a section is left out, then the others sound, but a pair is heard with everybody', async () => {
    const { playback, engine } = readyPlayback();
    playback.toggle('out', 'doubleBass');
    await playback.hold();
    await vi.waitFor(() => expect(engine.sections).toEqual(SECTIONS.slice(0, 4)));
    await playback.hear({ kind: 'pair', lowerId: bass.id, upperId: third.id });
    expect(engine.sections).toEqual(SECTIONS);
  });

  it('when it is stopped before the engine is there, then it never begins', async () => {
    const engine = new SilentEngine();
    let arrive: (engine: SoundEngine) => void = () => undefined;
    const playback = playbackOver(() => new Promise((resolve) => (arrive = resolve)));
    const playing = playback.hold();
    expect(playback.status.value).toBe('loading');
    playback.stop();
    arrive(engine);
    await playing;
    expect(engine.state).toBe('silent');
    expect(playback.mode.value).toBe('silent');
  });

  it('when the engine cannot be fetched, then that is said and the next press tries again', async () => {
    const engine = new SilentEngine();
    const load = vi.fn<() => Promise<SoundEngine>>().mockRejectedValueOnce(new Error('offline'));
    load.mockResolvedValueOnce(engine);
    const playback = playbackOver(load);
    await playback.strike();
    expect(playback.status.value).toBe('error');
    expect(playback.mode.value).toBe('silent');
    await playback.strike();
    expect(playback.status.value).toBe('ready');
    expect(engine.state).toBe('playing');
  });

  it('when the end of what is played is reached, then the signs go back to silence', async () => {
    const { playback, engine } = readyPlayback();
    await playback.strike();
    await vi.waitFor(() => expect(playback.level.value).toBeGreaterThan(0));
    engine.stop();
    await vi.waitFor(() => expect(playback.mode.value).toBe('silent'));
    await vi.waitFor(() => expect(playback.level.value).toBe(0));
  });

  it('when a progression is played, then it says which chord sounds', async () => {
    const { playback, engine } = readyPlayback();
    const progression = [{ chordId: 'first', beats: 2, sounds: chord }];
    playback.bring({ sounds: chord, progression, tempoBpm: 120 });
    await playback.playProgression();
    expect(engine.schedule).toEqual([{ key: 'first', startSeconds: 0, seconds: 1, sounds: chord }]);
    engine.head = 'first';
    await vi.waitFor(() => expect(playback.playingChordId.value).toBe('first'));
    playback.stop();
    expect(playback.playingChordId.value).toBeNull();
  });

  it('when a chord is changed while the progression plays, then it is played as it is now, in the same tempo', async () => {
    const { playback, engine } = readyPlayback();
    const first = { chordId: 'first', beats: 2, sounds: chord };
    playback.bring({ sounds: chord, progression: [first, { ...first, chordId: 'second' }], tempoBpm: 120 });
    await playback.playProgression();
    const second = { chordId: 'second', beats: 2, sounds: [top] };
    playback.bring({ sounds: chord, progression: [first, second], tempoBpm: 30 });
    await nextTick();
    expect(engine.schedule).toEqual([
      { key: 'first', startSeconds: 0, seconds: 1, sounds: chord },
      { key: 'second', startSeconds: 1, seconds: 1, sounds: [top] },
    ]);
  });

  it('when the tab comes back while something sounds, then the sound is woken, otherwise not', async () => {
    const { playback, engine } = readyPlayback();
    await playback.hold();
    document.dispatchEvent(new Event('visibilitychange'));
    expect(engine.woken).toBe(1);
    playback.silence();
    document.dispatchEvent(new Event('visibilitychange'));
    expect(engine.woken).toBe(1);
    expect(engine.silenced).toBe(1);
  });

  it('when the volume is pushed past its ends, then it stays within them', async () => {
    const { playback, engine } = readyPlayback();
    await playback.strike();
    playback.setVolume(12);
    expect(engine.volume).toBe(0);
    playback.setVolume(-999);
    expect(engine.volume).toBe(-60);
  });
});
