import type { CoverageRow, Stretch, TickerPicture } from '../../../answers/pictures/pictureData.ts';
import { colours } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { type Domain, plotFrame, sideAxis, within } from './axes.ts';
import { dayAxis } from './days.ts';

const rowHeight = 20;
const priceHeight = 200;
/** A gap narrower than this share of the picture is drawn this wide, or it could not be seen. */
const leastShare = 1 / 150;

/** The stretch, widened about its middle where it is too narrow to be seen. */
const visible = ({ from, to }: Stretch, span: number): Stretch => {
  const least = span * leastShare;
  const lack = Math.max(0, least - (to - from)) / 2;
  return { from: from - lack, to: to + lack };
};

const spanOf = (rows: readonly CoverageRow[]): Domain => {
  const covered = rows.flatMap((row) => row.covered);
  if (covered.length === 0) return [0, 1];
  return [Math.min(...covered.map(({ from }) => from)), Math.max(...covered.map(({ to }) => to))];
};

const bars = (rows: readonly CoverageRow[], pick: (row: CoverageRow) => readonly Stretch[]) =>
  rows.flatMap((row) => pick(row).map((each) => ({ ticker: row.ticker, ...each })));

/** One line for each ticker: where it has prices, where they lack, and who is held back. */
export const coveragePanel = (rows: readonly CoverageRow[]): Panel => {
  const names = rows.map(({ ticker }) => ticker);
  const frame = plotFrame(names);
  const [first, last] = spanOf(rows);
  const x = within([first, last]);
  const y = {
    field: 'ticker',
    type: 'nominal' as const,
    sort: names,
    scale: { domain: names },
    title: null,
    axis: sideAxis(frame),
  };
  const encoding = { x: { field: 'from', ...x, axis: dayAxis(first, last) }, x2: { field: 'to' }, y };
  const served = rows.filter(({ state }) => state === 'served');
  const heldBack = rows.filter(({ state }) => state === 'heldBack');
  return {
    width: frame.plot,
    height: rows.length * rowHeight,
    layer: [
      {
        data: { values: bars(served, ({ covered }) => covered) },
        mark: { type: 'rule', strokeWidth: 7, color: colours.blue },
        encoding,
      },
      {
        data: { values: bars(served, ({ gaps }) => gaps.map((gap) => visible(gap, last - first))) },
        mark: { type: 'rule', strokeWidth: 13, color: colours.vermillion },
        encoding,
      },
      {
        data: { values: bars(heldBack, ({ covered }) => covered) },
        mark: { type: 'rule', strokeWidth: 3, strokeDash: [3, 4], color: colours.quiet },
        encoding,
      },
    ],
  };
};

/** One ticker’s closes; where several days share a place, from their lowest to their highest. Gaps are shaded. */
export const pricePanel = ({ runs, gaps }: TickerPicture, head: string): Panel => {
  const frame = plotFrame(['10,000']);
  const points = runs.flatMap((run, place) =>
    run.map(({ day, low, high, close }) => ({ run: place, at: day, low, high, close })),
  );
  const days = runs.flatMap((run) => run.map(({ day }) => day));
  const [first, last] = [Math.min(...days), Math.max(...days)];
  const x = within([first, last]);
  const y = {
    type: 'quantitative' as const,
    scale: { zero: false },
    title: null,
    axis: { ...sideAxis(frame), tickCount: 5 },
  };
  const axis = dayAxis(first, last);
  return {
    title: head,
    width: frame.plot,
    height: priceHeight,
    layer: [
      {
        data: { values: gaps.map((gap) => visible(gap, last - first)) },
        mark: { type: 'rect', color: colours.vermillion, opacity: 0.35 },
        encoding: { x: { field: 'from', ...x, axis }, x2: { field: 'to' } },
      },
      {
        data: { values: points },
        mark: { type: 'rule', color: colours.blue, strokeWidth: 1 },
        encoding: { x: { field: 'at', ...x }, y: { field: 'low', ...y }, y2: { field: 'high' } },
      },
      {
        data: { values: points },
        mark: { type: 'line', color: colours.blue, strokeWidth: 1.5 },
        encoding: {
          x: { field: 'at', ...x },
          y: { field: 'close', ...y },
          detail: { field: 'run', type: 'nominal' },
        },
      },
    ],
  };
};
