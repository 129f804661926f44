import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { mixOklab } from '@/export/oklab';
import { PAPER_PALETTE, PAPER_SECTIONS, PAPER_SILT } from '@/export/palette';
import { sectionToken } from '@/charts/section-colours';
import { SECTIONS } from '#shared/strings/sections';

const tokens = readFileSync(new URL('../../../../src/assets/tokens.css', import.meta.url), 'utf8');

/** The light value of a token: the first that the style sheet gives. */
function light(token: string): string | undefined {
  return new RegExp(`${token}: (#[0-9a-f]{6})`).exec(tokens)?.[1];
}

/** Relative luminance. @source WCAG 2.2 */
function luminance(hex: string): number {
  const part = (at: number) => {
    const value = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * part(1) + 0.7152 * part(3) + 0.0722 * part(5);
}

describe('the colours of paper', () => {
  it('when a section is drawn, then its colour is that of the light page', () => {
    for (const section of SECTIONS) expect(PAPER_SECTIONS[section]).toBe(light(sectionToken(section)));
  });

  it('when muddiness is drawn, then the marks of the ramp are those of the light page', () => {
    const marks = [0, 25, 50, 75, 100];
    expect(PAPER_SILT).toEqual(marks.map((mark) => light(`--silt-${mark}`)));
    expect(marks.map(PAPER_PALETTE.silt)).toEqual([...PAPER_SILT]);
  });

  it('when it is printed grey, then more muddiness is always darker', () => {
    const shades = Array.from({ length: 21 }, (_, step) => luminance(PAPER_PALETTE.silt(step * 5)));
    expect(shades).toEqual([...shades].sort((a, b) => b - a));
    expect(new Set(shades).size).toBe(shades.length);
  });
});

describe('mixing in Oklab', () => {
  it('when black and white are mixed, then the half is the grey of Oklab lightness one half', () => {
    // L = 0.5 is linear light 0.125, in sRGB 0.3886: 99 of 255.
    expect(mixOklab('#000000', '#ffffff', 0.5)).toBe('#636363');
  });

  it('when nothing of one is taken, then the other is left', () => {
    expect(mixOklab('#c3a063', '#46291a', 0)).toBe('#c3a063');
    expect(mixOklab('#c3a063', '#46291a', 1)).toBe('#46291a');
  });
});
