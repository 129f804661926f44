import { describe, expect, it } from 'vitest';
import { effectScope } from 'vue';
import { useMidiKeyboard } from '@/composables/midi-keyboard';
import { MidiUnavailable, type MidiDevice, type MidiSource } from '@/composables/midi-source';

/** A keyboard that the test plays. */
function fakeKeyboard() {
  let devices: readonly MidiDevice[] = [{ id: 'one', name: 'First' }];
  let tell: (deviceId: string, data: Uint8Array) => void = () => undefined;
  let plugged: () => void = () => undefined;
  const told: string[] = [];
  const source: MidiSource = {
    devices: () => devices,
    onDevices: (listen) => (plugged = listen),
    onMessage: (listen) => (tell = listen),
    close: () => told.push('closed'),
  };
  const scope = effectScope();
  const keyboard = scope.run(() =>
    useMidiKeyboard(() => Promise.resolve(source), {
      played: (keys) => told.push(keys.join(' ')),
      released: () => told.push('released'),
    }),
  );
  if (!keyboard) throw new Error('no scope');
  const send = (bytes: readonly number[], from = 'one') => tell(from, Uint8Array.from(bytes));
  const plug = (now: readonly MidiDevice[]) => {
    devices = now;
    plugged();
  };
  return { keyboard, send, plug, told, scope };
}

describe('a MIDI keyboard', () => {
  it('when keys are held one after another, then they are one chord until all are up', async () => {
    const { keyboard, send, told } = fakeKeyboard();
    await keyboard.start();
    send([0x90, 60, 80]);
    send([0x91, 48, 80]);
    send([0x80, 60, 0]);
    send([0x90, 64, 80]);
    send([0x90, 48, 0]);
    send([0x80, 64, 0]);
    expect(told).toEqual(['60', '48 60', '48 60 64', 'released']);
  });

  it('when it is pulled out with keys down, then they are let go', async () => {
    const { keyboard, send, plug, told } = fakeKeyboard();
    await keyboard.start();
    send([0x90, 60, 80]);
    plug([]);
    expect(told.at(-1)).toBe('released');
    expect(keyboard.devices.value).toEqual([]);
  });

  it('when one of two is chosen, then the other is not heard', async () => {
    const { keyboard, send, plug, told } = fakeKeyboard();
    await keyboard.start();
    plug([
      { id: 'one', name: 'First' },
      { id: 'two', name: 'Second' },
    ]);
    keyboard.deviceId.value = 'two';
    send([0x90, 60, 80], 'one');
    send([0x90, 62, 80], 'two');
    expect(told).toEqual(['62']);
  });

  it('when all notes off is sent, or listening stops, then nothing stays down', async () => {
    const { keyboard, send, told, scope } = fakeKeyboard();
    await keyboard.start();
    send([0x90, 60, 80]);
    send([0xb0, 123, 0]);
    send([0x90, 62, 80]);
    scope.stop();
    expect(told).toEqual(['60', 'released', '62', 'closed', 'released']);
    expect(keyboard.status.value).toBe('off');
  });

  it('when there is no MIDI, then the reason is told', async () => {
    const refused = () => Promise.reject(new MidiUnavailable('refused'));
    const keyboard = effectScope().run(() =>
      useMidiKeyboard(refused, { played: () => undefined, released: () => undefined }),
    );
    await keyboard?.start();
    expect(keyboard?.trouble.value).toBe('refused');
    expect(keyboard?.status.value).toBe('off');
  });
});
