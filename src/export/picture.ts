import { svgNode, svgText, type SvgNode } from '@/export/svg/nodes';

/** Pixels of the picture for each of the figure. */
const SHARPNESS = 2;

/**
 * A figure as a file that opens alone: its fonts inside, on a page of its own colour.
 * @param figure with its width and height
 * @param page colour under it
 * @param fontRules style rules that bring the fonts with them
 * @param title what the file is of, for those who cannot see it
 */
export function standAloneSvg(figure: SvgNode, page: string, fontRules: string, title: string): string {
  const { width = 0, height = 0 } = figure.attributes;
  const children = [
    svgNode('title', {}, [title]),
    svgNode('style', {}, [fontRules]),
    svgNode('rect', { width, height, fill: page }),
    ...figure.children,
  ];
  return `<?xml version="1.0" encoding="UTF-8"?>\n${svgText({ ...figure, children })}\n`;
}

/** @returns the picture of a stand-alone drawing, twice as sharp */
export async function pngOf(svg: string): Promise<Blob> {
  const url = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = Math.ceil(image.naturalWidth * SHARPNESS);
    canvas.height = Math.ceil(image.naturalHeight * SHARPNESS);
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await new Promise((resolve, reject) => {
      canvas.toBlob((blob) => {
        if (blob) resolve(blob);
        else reject(new Error('The picture could not be made.'));
      }, 'image/png');
    });
  } finally {
    URL.revokeObjectURL(url);
  }
}
