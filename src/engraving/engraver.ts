import type * as Core from 'vexflow/core';
import { loadMusicFont, MUSIC_FONT } from '@/engraving/music-font';

/** What engraves: VexFlow with its music font at hand, so that what it measures is what is seen. */
export type Engraver = typeof Core;

let loading: Promise<Engraver> | null = null;

async function load(): Promise<Engraver> {
  const [core] = await Promise.all([import('vexflow/core'), loadMusicFont()]);
  core.VexFlow.setFonts(MUSIC_FONT);
  return core;
}

/** Loads the engraver once, apart from the page's first needs; a failed attempt is made anew when asked again. */
export function loadEngraver(): Promise<Engraver> {
  loading ??= load().catch((error: unknown) => {
    loading = null;
    throw error;
  });
  return loading;
}
