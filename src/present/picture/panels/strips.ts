import { colours, sheetMargin, sheetWidth, sizes } from '../look.ts';
import { textWidth } from '../metrics.ts';
import type { Panel } from '../sheet.ts';
import { type Domain, plotFrame, roomy, signed, within } from './axes.ts';

/** One row: an estimate with its interval, named on the left, its figures in words on the right. */
export type Strip = {
  readonly label: string;
  readonly estimate: number | null;
  /** An end that is open runs to the edge, with an arrow. */
  readonly lower: number | null;
  readonly upper: number | null;
  readonly figures: string;
  readonly tone: 'main' | 'quiet';
};

/** A value that all rows are read against, named above them. */
export type Landmark = { readonly value: number; readonly label: string };

export type StripColumns = { readonly labels: number; readonly figures: number; readonly plot: number };

const between = 10;
const rowHeight = 27;

const widest = (texts: readonly string[]): number =>
  Math.ceil(Math.max(0, ...texts.map((text) => textWidth(text, { fontSize: sizes.label }))));

/** The same columns for all strips of a picture, so that what lies below one another can be compared. */
export const stripColumns = (strips: readonly Strip[]): StripColumns => {
  const labels = plotFrame(strips.map(({ label }) => label)).labels;
  const figures = widest(strips.map(({ figures: words }) => words));
  const taken = labels + (figures === 0 ? between : figures + 2 * between);
  return { labels, figures, plot: sheetWidth - 2 * sheetMargin - taken };
};

export type StripPanel = {
  readonly head: string | null;
  readonly strips: readonly Strip[];
  readonly landmarks: readonly Landmark[];
  readonly domain: Domain;
  readonly columns: StripColumns;
  readonly axisTitle: string | null;
  /** How the axis writes its values, in the notation of the grammar. */
  readonly format: string;
};

const toneColours = { main: colours.blue, quiet: colours.quiet } as const;

const barsOf = (strips: readonly Strip[], [low, high]: Domain) =>
  strips
    .filter(({ lower, upper }) => lower !== null || upper !== null)
    .map(({ label, lower, upper, tone }) => ({
      label,
      from: Math.max(low, lower ?? low),
      to: Math.min(high, upper ?? high),
      tone,
    }));

/** Where a bar goes on beyond the edge, which way. */
const arrowsOf = (strips: readonly Strip[], [low, high]: Domain) =>
  strips.flatMap(({ label, lower, upper, tone }) => [
    ...(lower === null && upper !== null ? [{ label, at: low, tone, way: 'left' }] : []),
    ...(upper === null && lower !== null ? [{ label, at: high, tone, way: 'right' }] : []),
  ]);

const toneColour = {
  field: 'tone',
  type: 'nominal',
  scale: { domain: Object.keys(toneColours), range: Object.values(toneColours) },
  legend: null,
} as const;

/** Two landmarks are named away from each other, however near they are. */
const sideOf = (value: number, landmarks: readonly Landmark[]): 'center' | 'left' | 'right' => {
  const others = landmarks.filter((other) => other.value !== value);
  if (others.length === 0) return 'center';
  return others.some((other) => other.value < value) ? 'left' : 'right';
};

export const stripPanel = (panel: StripPanel): Panel => {
  const { strips, landmarks, domain, columns, format } = panel;
  const x = within(domain);
  const names = strips.map(({ label }) => label);
  const y = {
    field: 'label',
    type: 'nominal' as const,
    sort: names,
    title: null,
    scale: { domain: names },
    axis: { domain: false, ticks: false, minExtent: columns.labels, maxExtent: columns.labels },
  };
  const axis = { labelExpr: signed(format), title: panel.axisTitle, tickCount: 5, ...roomy };
  return {
    ...(panel.head === null ? {} : { title: panel.head }),
    width: columns.plot,
    height: strips.length * rowHeight,
    layer: [
      {
        data: { values: landmarks.map((each) => ({ ...each })) },
        mark: { type: 'rule', color: colours.ink, strokeDash: [4, 3] },
        encoding: { x: { field: 'value', ...x, axis } },
      },
      {
        data: { values: barsOf(strips, domain) },
        mark: { type: 'rule', strokeWidth: 5, strokeCap: 'butt' },
        encoding: { x: { field: 'from', ...x, axis }, x2: { field: 'to' }, y, color: toneColour },
      },
      {
        data: { values: arrowsOf(strips, domain) },
        mark: { type: 'point', filled: true, opacity: 1, size: 90 },
        encoding: {
          x: { field: 'at', ...x },
          y,
          color: toneColour,
          shape: {
            field: 'way',
            type: 'nominal',
            scale: { domain: ['left', 'right'], range: ['triangle-left', 'triangle-right'] },
            legend: null,
          },
        },
      },
      {
        data: {
          values: strips.flatMap(({ label, estimate }) => (estimate === null ? [] : [{ label, estimate }])),
        },
        mark: { type: 'point', filled: true, opacity: 1, size: 80, color: colours.ink },
        encoding: { x: { field: 'estimate', ...x }, y },
      },
      {
        data: { values: strips.map(({ label, figures }) => ({ label, figures })) },
        mark: { type: 'text', align: 'left', baseline: 'middle' },
        encoding: { x: { value: columns.plot + between }, y, text: { field: 'figures' } },
      },
      ...landmarks
        .filter(({ label }) => label !== '')
        .map(({ value, label }) => ({
          data: { values: [{ value, label }] },
          mark: {
            type: 'text' as const,
            baseline: 'bottom' as const,
            color: colours.quiet,
            align: sideOf(value, landmarks),
          },
          encoding: { x: { field: 'value', ...x }, y: { value: -3 }, text: { field: 'label' } },
        })),
    ],
  };
};
