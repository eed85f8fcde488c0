import { colours, fontFamily, sheetMargin, sheetWidth, sizes } from './look.ts';
import { type Lettering, wrapped } from './metrics.ts';
import type { Sheet } from './sheet.ts';

const escaped = (text: string): string =>
  text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');

type Written = Lettering & { readonly colour: string; readonly anchor?: 'start' | 'end' };

const textAt = (text: string, x: number, y: number, written: Written): string =>
  `<text x="${x}" y="${y}" font-size="${written.fontSize}" fill="${written.colour}"` +
  `${written.bold === true ? ' font-weight="bold"' : ''}${written.anchor === 'end' ? ' text-anchor="end"' : ''}>` +
  `${escaped(text)}</text>`;

const room = sheetWidth - 2 * sheetMargin;
const lineHeight = (fontSize: number): number => Math.round(fontSize * 1.3);

/** Lines of text one below the other from `top` on, and where they end. */
const paragraph = (texts: readonly string[], top: number, written: Written) => {
  const lines = texts.flatMap((text) => wrapped(text, room, written));
  const step = lineHeight(written.fontSize);
  return {
    svg: lines.map((line, place) => textAt(line, sheetMargin, top + (place + 0.8) * step, written)).join(''),
    bottom: top + lines.length * step,
  };
};

export type ChartSize = { readonly width: number; readonly height: number };

/** The size that a drawn chart says it has. */
export const sizeOfChart = (svg: string): ChartSize => {
  const size = /<svg[^>]*\swidth="([\d.]+)"[^>]*\sheight="([\d.]+)"/.exec(svg);
  if (size === null) throw new Error('sizeOfChart: the drawing says no size');
  return { width: Number(size[1]), height: Number(size[2]) };
};

/** The drawing without its own frame: one frame within another makes the rasteriser draw everything on a layer of its own. */
const contentOf = (svg: string): string => svg.replace(/^<svg[^>]*>/, '').replace(/<\/svg>\s*$/, '');

const gap = 10;

/** The whole picture: title, sentences, chart and corners on an opaque ground with a border. */
export const framed = (sheet: Sheet, chart: string): string => {
  const { width, height } = sizeOfChart(chart);
  const title = paragraph([sheet.title], sheetMargin, {
    fontSize: sizes.title,
    colour: colours.ink,
    bold: true,
  });
  const lines = paragraph(sheet.lines, title.bottom + 4, { fontSize: sizes.line, colour: colours.ink });
  const chartTop = lines.bottom + gap;
  const footLine = chartTop + height + gap + sizes.foot;
  const total = Math.ceil(footLine + sheetMargin);
  const foot = { fontSize: sizes.foot, colour: colours.quiet };
  const [left, right] = sheet.corners;
  const wide = Math.max(sheetWidth, Math.ceil(width) + 2 * sheetMargin);
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${wide}" height="${total}" viewBox="0 0 ${wide} ${total}" font-family="${fontFamily}">` +
    `<rect x="0.5" y="0.5" width="${wide - 1}" height="${total - 1}" rx="6" fill="${colours.ground}" stroke="${colours.border}"/>` +
    title.svg +
    lines.svg +
    `<g transform="translate(${sheetMargin},${chartTop})">${contentOf(chart)}</g>` +
    textAt(left, sheetMargin, footLine, foot) +
    textAt(right, wide - sheetMargin, footLine, { ...foot, anchor: 'end' }) +
    '</svg>'
  );
};
