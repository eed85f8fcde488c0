import { createRequire } from 'node:module';
import { Resvg } from '@resvg/resvg-js';
import { pixelsPerUnit } from '../../present/picture/look.ts';

const { resolve } = createRequire(import.meta.url);

/** The only letters there are: those of the machine differ from machine to machine. */
const fontFiles = ['DejaVuSansCondensed.ttf', 'DejaVuSansCondensed-Bold.ttf'].map((name) =>
  resolve(`dejavu-fonts-ttf/ttf/${name}`),
);

const drawn = (svg: string) =>
  new Resvg(svg, {
    font: { loadSystemFonts: false, fontFiles, defaultFontFamily: 'DejaVu Sans' },
    fitTo: { mode: 'zoom', value: pixelsPerUnit },
  }).render();

/** The picture as a file. */
export const toPng = (svg: string): Uint8Array => new Uint8Array(drawn(svg).asPng());

/** The picture as pixels, four bytes each: red, green, blue, opacity. */
export const toPixels = (svg: string) => {
  const { pixels, width, height } = drawn(svg);
  return { pixels: new Uint8Array(pixels), width, height };
};
