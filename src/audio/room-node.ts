import { connect, Gain, type BaseContext } from 'tone';
import { amplitudeOf } from '@/audio/levels';
import { ROOM_LEVEL, roomAnswer } from '@/audio/room';

/** The room between the players and the loudspeaker. */
export interface RoomNode {
  /** Takes the sound of all sections. */
  readonly input: Gain;
  setOn(on: boolean, at: number): void;
  /** Lets what still rings in it fall silent at once. */
  empty(): void;
}

const GLIDE_SECONDS = 0.05;

function answerBuffer(context: BaseContext): AudioBuffer {
  const { left, right } = roomAnswer(context.sampleRate);
  const buffer = context.createBuffer(2, left.length, context.sampleRate);
  buffer.copyToChannel(left, 0);
  buffer.copyToChannel(right, 1);
  return buffer;
}

function convolver(context: BaseContext, buffer: AudioBuffer): ConvolverNode {
  const node = context.createConvolver();
  node.normalize = false;
  node.buffer = buffer;
  // One sound goes in and each ear hears its own answer to it.
  node.channelCount = 1;
  node.channelCountMode = 'explicit';
  return node;
}

/** Builds the room beside the direct way into `output`. */
export function buildRoom(context: BaseContext, output: Gain, on: boolean): RoomNode {
  const input = new Gain({ context, gain: 1 });
  const level = amplitudeOf(ROOM_LEVEL);
  const answer = new Gain({ context, gain: on ? level : 0 }).connect(output);
  const buffer = answerBuffer(context);
  let walls = convolver(context, buffer);
  const enter = (): void => {
    connect(input, walls);
    connect(walls, answer);
  };
  input.connect(output);
  enter();
  return {
    input,
    setOn: (wanted, at) => void answer.gain.linearRampTo(wanted ? level : 0, GLIDE_SECONDS, at),
    empty() {
      input.disconnect(walls);
      walls.disconnect();
      walls = convolver(context, buffer);
      enter();
    },
  };
}
