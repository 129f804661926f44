import { computed, ref, shallowRef, type ComputedRef, type Ref, type ShallowRef } from 'vue';
import { EVERYBODY, heardOf, heardSections, WHOLE_CHORD, type Listening, type Mix } from '@/audio/listening';
import { loudestLevel } from '@/audio/levels';
import { octaveHigher } from '@/audio/octave-higher';
import type { ProgressionChord } from '@/audio/schedule';
import { SECTIONS, type Section } from '#shared/strings/sections';
import type { Decibels } from '#shared/units';
import type { VoiceSound } from '#shared/voicing/analysis';

/** What there is to hear. */
export interface PlaybackMaterial {
  readonly sounds: readonly VoiceSound[];
  readonly progression: readonly ProgressionChord[];
  readonly tempoBpm: number;
}

interface PlaybackChoice {
  readonly material: ShallowRef<PlaybackMaterial>;
  readonly listening: ShallowRef<Listening>;
  readonly mix: ShallowRef<Mix>;
  /** Everything is heard an octave higher than it is written. */
  readonly octave: Ref<boolean>;
  /** As it is to sound: where it stands, or an octave higher. */
  lifted(sounds: readonly VoiceSound[]): readonly VoiceSound[];
  readonly progression: ComputedRef<readonly ProgressionChord[]>;
  readonly heard: ComputedRef<readonly VoiceSound[]>;
  /** A pair or a register is heard whoever is left out of the chord. */
  readonly sections: ComputedRef<readonly Section[]>;
  /** Of the whole progression, so that a soft chord stays soft and a part as strong as it is in its chord. */
  loudest(): Decibels;
}

/** Whether whole sections sound, which may be left out. */
const isWhole = ({ kind }: Listening): boolean => kind === 'chord' || kind === 'trial';

const NOTHING: PlaybackMaterial = { sounds: [], progression: [], tempoBpm: 60 };

/** What of the chord is heard, and by whom. */
export function usePlaybackChoice(): PlaybackChoice {
  const material = shallowRef(NOTHING);
  const listening = shallowRef<Listening>(WHOLE_CHORD);
  const mix = shallowRef<Mix>(EVERYBODY);
  const octave = ref(false);
  const lifted = (sounds: readonly VoiceSound[]) => (octave.value ? octaveHigher(sounds) : sounds);
  const progression = computed(() =>
    material.value.progression.map((chord) => ({ ...chord, sounds: lifted(chord.sounds) })),
  );
  const heard = computed(() => lifted(heardOf(material.value.sounds, listening.value)));
  const sections = computed(() => (isWhole(listening.value) ? heardSections(mix.value) : SECTIONS));
  const loudest = () =>
    loudestLevel([
      material.value.sounds,
      heard.value,
      ...material.value.progression.map(({ sounds }) => sounds),
    ]);
  return { material, listening, mix, octave, lifted, progression, heard, sections, loudest };
}
