import type { DigestFigures } from '../../../terms/scheduledPosts.ts';
import { colours } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { type Domain, type PlotFrame, within } from './axes.ts';

export const digestRowHeight = 38;

export type DigestStrip = {
  readonly figures: DigestFigures;
  readonly returns: readonly number[];
  readonly words: string;
  /** The same for every strip, so that heights can be compared. */
  readonly domain: Domain;
  readonly days: number;
  readonly frame: PlotFrame;
};

/** One ticker: its last returns as sticks, its VaR as a line with the interval shaded, the last return marked. */
export const digestStrip = ({ figures, returns, words, domain, days, frame }: DigestStrip): Panel => {
  const x = {
    type: 'quantitative' as const,
    scale: { domain: [-days, 1], nice: false, zero: false },
    axis: null,
  };
  const y = { ...within(domain), axis: null };
  /** What goes beyond the strip ends at its edge. */
  const inside = (each: number): number => Math.min(domain[1], Math.max(domain[0], each));
  const { var: value, varLower, varUpper, ticker } = figures;
  const sticks = returns.map((each, place) => ({
    at: place - returns.length + 1,
    from: 0,
    to: inside(each),
  }));
  return {
    width: frame.plot,
    height: digestRowHeight,
    layer: [
      {
        data: {
          values: [{ lower: inside(0 - (varUpper ?? value)), upper: inside(0 - (varLower ?? value)) }],
        },
        mark: { type: 'rect', color: colours.sky, opacity: 0.6 },
        encoding: {
          x: { datum: -days, ...x },
          x2: { datum: 1 },
          y: { field: 'lower', ...y },
          y2: { field: 'upper' },
        },
      },
      {
        data: { values: [{ level: 0 }] },
        mark: { type: 'rule', color: colours.grid },
        encoding: { y: { field: 'level', ...y } },
      },
      {
        data: { values: [{ level: 0 - value }] },
        mark: { type: 'rule', color: colours.blue, strokeWidth: 1.5 },
        encoding: { y: { field: 'level', ...y } },
      },
      {
        data: { values: sticks },
        mark: { type: 'rule', color: colours.border, strokeWidth: 2 },
        encoding: { x: { field: 'at', ...x }, y: { field: 'from', ...y }, y2: { field: 'to' } },
      },
      {
        data: { values: [{ at: 0, last: inside(figures.lastReturn) }] },
        mark: {
          type: 'point',
          filled: true,
          opacity: 1,
          size: 70,
          shape: figures.exceeded === true ? 'triangle-down' : 'circle',
          color: figures.exceeded === true ? colours.vermillion : colours.ink,
        },
        encoding: { x: { field: 'at', ...x }, y: { field: 'last', ...y } },
      },
      {
        data: { values: [{ ticker }] },
        mark: { type: 'text', align: 'left', baseline: 'middle', fontWeight: 'bold' },
        encoding: {
          x: { value: -frame.labels },
          y: { value: digestRowHeight / 2 },
          text: { field: 'ticker' },
        },
      },
      {
        data: { values: [{ words }] },
        mark: { type: 'text', align: 'left', baseline: 'middle' },
        encoding: {
          x: { value: frame.plot + 8 },
          y: { value: digestRowHeight / 2 },
          text: { field: 'words' },
        },
      },
    ],
  };
};
