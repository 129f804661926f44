import type { StudyDocument } from '#shared/study/study.document';
import type { SoundSettings } from '#shared/voicing/analysis';

/** What of a study its sound, and what is said of it, depend on besides the chords. */
export function soundSettingsOf(
  study: Pick<StudyDocument, 'a4Hz' | 'intonation' | 'ensemble' | 'key'> & Pick<SoundSettings, 'limits'>,
): SoundSettings {
  return {
    a4Hz: study.a4Hz,
    intonation: study.intonation,
    ensemble: study.ensemble,
    key: { tonic: study.key.tonic },
    limits: study.limits ?? null,
  };
}
