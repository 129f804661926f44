import { onScopeDispose, ref, shallowRef } from 'vue';
import type { Midi } from '#shared/units';
import { MidiUnavailable, type MidiDevice, type MidiSource } from '@/composables/midi-source';

/** MIDI 1.0: the status of a message is its upper four bits. */
const NOTE_OFF = 0x80;
const NOTE_ON = 0x90;
const CONTROL = 0xb0;
const STATUS_BITS = 0xf0;
/** MIDI 1.0: all sound off and all notes off. */
const ALL_OFF: readonly number[] = [120, 123];

/** What is told of the playing. */
export interface MidiListener {
  /** Every key pressed since all were up, rising; told with each new one. */
  readonly played: (keys: readonly Midi[]) => void;
  /** All keys are up: the chord is done. */
  readonly released: () => void;
}

/** A keyboard whose held notes are a chord. A key that stays down, for whatever reason, is let go by `stop`. */
export function useMidiKeyboard(open: () => Promise<MidiSource>, listener: MidiListener) {
  const status = ref<'off' | 'opening' | 'on'>('off');
  const trouble = ref<string | null>(null);
  const devices = shallowRef<readonly MidiDevice[]>([]);
  /** The device that is listened to; `null` for all. */
  const deviceId = ref<string | null>(null);
  const held = new Map<Midi, string>();
  const chord = new Set<Midi>();
  let source: MidiSource | null = null;

  function release(keys: readonly Midi[]): void {
    const before = held.size;
    keys.forEach((key) => held.delete(key));
    if (before === 0 || held.size > 0) return;
    chord.clear();
    listener.released();
  }

  function message(from: string, [status = 0, key = 0, velocity = 0]: Uint8Array): void {
    if (deviceId.value !== null && from !== deviceId.value) return;
    const kind = status & STATUS_BITS;
    if (kind === CONTROL && ALL_OFF.includes(key)) return release([...held.keys()]);
    // MIDI 1.0: a note on with velocity 0 is a note off.
    if (kind === NOTE_OFF || (kind === NOTE_ON && velocity === 0)) return release([key]);
    if (kind !== NOTE_ON) return;
    held.set(key, from);
    chord.add(key);
    listener.played([...chord].sort((a, b) => a - b));
  }

  /** A keyboard that is pulled out lets go of its keys. */
  function plugged(): void {
    devices.value = source?.devices() ?? [];
    const there = new Set(devices.value.map(({ id }) => id));
    release([...held].filter(([, from]) => !there.has(from)).map(([key]) => key));
    if (deviceId.value !== null && !there.has(deviceId.value)) deviceId.value = null;
  }

  async function start(): Promise<void> {
    if (status.value !== 'off') return;
    status.value = 'opening';
    trouble.value = null;
    try {
      source = await open();
      source.onMessage(message);
      source.onDevices(plugged);
      plugged();
      status.value = 'on';
    } catch (error) {
      status.value = 'off';
      if (!(error instanceof MidiUnavailable)) throw error;
      trouble.value = error.message;
    }
  }

  function stop(): void {
    source?.close();
    source = null;
    status.value = 'off';
    release([...held.keys()]);
  }

  onScopeDispose(stop);
  return { status, trouble, devices, deviceId, start, stop };
}
