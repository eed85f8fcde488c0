import { createRequire } from 'node:module';
import { Resvg } from '@resvg/resvg-js';
import { describe, expect, it } from 'vitest';
import { textWidth, wrapped } from '../../../src/present/picture/metrics.ts';

const { resolve } = createRequire(import.meta.url);
const font = {
  loadSystemFonts: false,
  fontFiles: ['DejaVuSansCondensed.ttf', 'DejaVuSansCondensed-Bold.ttf'].map((name) =>
    resolve(`dejavu-fonts-ttf/ttf/${name}`),
  ),
  defaultFontFamily: 'DejaVu Sans',
};

/** How far the ink of a text reaches, as the rasteriser draws it (@resvg/resvg-js 2.6.2). */
const inkWidth = (text: string, bold: boolean): number => {
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="2000" height="60"><text x="0" y="40" font-size="20" font-family="DejaVu Sans"${bold ? ' font-weight="bold"' : ''}>${text}</text></svg>`;
  return new Resvg(svg, { font }).getBBox()?.width ?? 0;
};

const texts = [
  'KELP’s mean daily return over 60 days',
  '−0.13 to +0.30%',
  'Data to 2026-11-27',
  'R-C4EWCHQPXH',
  '± 0.079% × 4 · “quoted” – dashed…',
];

describe('the width of a text without a canvas', () => {
  it.each(texts)('is what the rasteriser draws: %s', (text) => {
    // The ink ends up to two side bearings before the advance does, and kerning narrows: at 20 px under 5 px in all.
    expect(textWidth(text, { fontSize: 20 }) - inkWidth(text, false)).toBeGreaterThan(-0.5);
    expect(textWidth(text, { fontSize: 20 }) - inkWidth(text, false)).toBeLessThan(5);
  });

  it.each(texts)('leaves room for bold letters: %s', (text) => {
    const room = textWidth(text, { fontSize: 20, bold: true });
    expect(room).toBeGreaterThan(inkWidth(text, true) - 0.5);
    expect(room).toBeLessThan(inkWidth(text, true) * 1.1 + 4);
  });

  it('breaks lines between words and loses none', () => {
    const lettering = { fontSize: 14 };
    const lines = wrapped('one two three four five six seven eight nine ten', 100, lettering);
    expect(lines.length).toBeGreaterThan(2);
    expect(lines.join(' ')).toBe('one two three four five six seven eight nine ten');
    for (const line of lines) expect(textWidth(line, lettering)).toBeLessThanOrEqual(100);
    expect(wrapped('incomprehensibilities', 10, lettering)).toEqual(['incomprehensibilities']);
  });
});
