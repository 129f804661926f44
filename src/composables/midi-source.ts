/** A keyboard that is plugged in. */
export interface MidiDevice {
  readonly id: string;
  readonly name: string;
}

/** All that is asked of the machine's MIDI: a test plays one of its own. */
export interface MidiSource {
  readonly devices: () => readonly MidiDevice[];
  /** Told whenever a device is plugged in or out. */
  readonly onDevices: (tell: () => void) => void;
  /** Told each message with the device that sent it. */
  readonly onMessage: (tell: (deviceId: string, data: Uint8Array) => void) => void;
  readonly close: () => void;
}

/** Why there is no MIDI, in words for the reader. */
export class MidiUnavailable extends Error {}

/**
 * Asks the browser for its MIDI keyboards.
 * @throws MidiUnavailable where the browser has none, the page may not ask, or the reader refuses
 */
export async function openBrowserMidi(): Promise<MidiSource> {
  if (!isSecureContext) {
    throw new MidiUnavailable('A MIDI keyboard needs this page by https, or from localhost.');
  }
  if (typeof navigator.requestMIDIAccess !== 'function') {
    throw new MidiUnavailable('This browser has no Web MIDI; Chromium, Edge and Firefox have.');
  }
  const access = await navigator.requestMIDIAccess().catch(() => {
    throw new MidiUnavailable('MIDI was refused: allow it for this page in the browser’s settings.');
  });
  let tellMessage: (deviceId: string, data: Uint8Array) => void = () => undefined;
  const listen = (): void => {
    for (const input of access.inputs.values()) {
      input.onmidimessage = ({ data }) => data && tellMessage(input.id, data);
    }
  };
  listen();
  return {
    devices: () => [...access.inputs.values()].map(({ id, name }) => ({ id, name: name ?? 'MIDI keyboard' })),
    onDevices: (tell) => {
      access.onstatechange = () => {
        listen();
        tell();
      };
    },
    onMessage: (tell) => (tellMessage = tell),
    close: () => {
      access.onstatechange = null;
      for (const input of access.inputs.values()) input.onmidimessage = null;
    },
  };
}
