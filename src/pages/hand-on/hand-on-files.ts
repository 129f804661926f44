import type { NoteNaming } from '#shared/pitch/display';
import type { DraftDocument } from '#shared/study/draft';
import type { Chord } from '#shared/study/study.document';
import { analysisOf } from '@/composables/analysis';
import { loadEngraver } from '@/engraving/engraver';
import { inlinedFonts } from '@/engraving/inlined-fonts';
import { csvOf, type Table } from '@/export/csv';
import { handOut } from '@/export/download';
import { chordFigure } from '@/export/figure/figure';
import { figureStaves } from '@/export/figure/figure-staves';
import { SHEET_LAYOUT } from '@/export/figure/sheet-layout';
import { fileName } from '@/export/file-names';
import { PAPER_PALETTE } from '@/export/palette';
import { pngOf, standAloneSvg } from '@/export/picture';
import { studyFileText } from '@/export/study-file';
import { svgText } from '@/export/svg/nodes';
import { pairsTable, partialsTable } from '@/export/tables';

/** What a file is made from. */
export interface HandedOn {
  readonly study: DraftDocument;
  readonly chord: Chord;
  readonly naming: NoteNaming;
}

const ALL = { overtones: true, figures: true };

function nameOf({ study, chord }: HandedOn): string {
  return chord.name ?? `Chord ${study.chords.indexOf(chord) + 1}`;
}

async function svgOf(handed: HandedOn): Promise<string> {
  const { study, chord, naming } = handed;
  const engraver = await loadEngraver();
  const layout = SHEET_LAYOUT;
  const palette = PAPER_PALETTE;
  const staves = figureStaves(engraver, { layout, chord, study, naming, palette });
  const figure = chordFigure({
    ...{ chord, analysis: analysisOf(chord, study), ensemble: study.ensemble, a4Hz: study.a4Hz },
    ...{ naming, palette, layout, staves, shown: ALL },
  });
  const rules = await inlinedFonts(svgText(figure));
  return standAloneSvg(figure, palette.page, rules, `${study.title}: ${nameOf(handed)}`);
}

function handOutTable(handed: HandedOn, table: Table, what: string): void {
  const file = new Blob([csvOf(table)], { type: 'text/csv;charset=utf-8' });
  handOut(file, fileName([handed.study.title, nameOf(handed), what], 'csv'));
}

/** Makes a file of what lies on the bench and hands it to the reader. */
export const FILES = {
  async svg(handed: HandedOn): Promise<void> {
    const file = new Blob([await svgOf(handed)], { type: 'image/svg+xml' });
    handOut(file, fileName([handed.study.title, nameOf(handed)], 'svg'));
  },
  async png(handed: HandedOn): Promise<void> {
    handOut(await pngOf(await svgOf(handed)), fileName([handed.study.title, nameOf(handed)], 'png'));
  },
  partials(handed: HandedOn): Promise<void> {
    handOutTable(handed, partialsTable(analysisOf(handed.chord, handed.study)), 'partials');
    return Promise.resolve();
  },
  pairs(handed: HandedOn): Promise<void> {
    handOutTable(handed, pairsTable(analysisOf(handed.chord, handed.study)), 'pairs');
    return Promise.resolve();
  },
  'study-file'({ study }: HandedOn): Promise<void> {
    const file = new Blob([studyFileText(study)], { type: 'application/json' });
    handOut(file, fileName([study.title], 'siltline.json'));
    return Promise.resolve();
  },
} as const;
