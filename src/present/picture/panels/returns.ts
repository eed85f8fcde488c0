import type { ReturnPicture } from '../../../answers/pictures/pictureData.ts';
import { colours } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { type Domain, type PlotFrame, sideAxis, signed, within } from './axes.ts';
import { curveLegend, curveRows, untilTheyLeave } from './curves.ts';
import type { Landmark } from './strips.ts';

const histogramHeight = 120;
const lossHeight = 150;
/** Left of a landmark stands its name: this share of the axis. */
const landmarkRoom = 0.12;

/** Named lines across a panel: the first is named on its left, the others on their right, so that near ones stay readable. */
const landmarkLayers = (landmarks: readonly Landmark[], x: object) =>
  landmarks.flatMap(({ value, label }, place) => [
    {
      data: { values: [{ value }] },
      mark: {
        type: 'rule' as const,
        color: colours.ink,
        strokeWidth: 1.5,
        strokeDash: place === 0 ? [1, 0] : [3, 2],
      },
      encoding: { x: { field: 'value', ...x } },
    },
    {
      data: { values: [{ value, label }] },
      mark: {
        type: 'text' as const,
        align: place === 0 ? ('right' as const) : ('left' as const),
        baseline: 'top' as const,
        dx: place === 0 ? -4 : 4,
      },
      encoding: { x: { field: 'value', ...x }, y: { value: 2 }, text: { field: 'label' } },
    },
  ]);

export type HistogramPanel = {
  readonly head: string;
  readonly returns: Pick<ReturnPicture, 'bins' | 'counts'>;
  readonly landmarks: readonly Landmark[];
  readonly frame: PlotFrame;
};

/** How many days had which return, and what the two fitted distributions expect. */
export const histogramPanel = ({ head, returns, landmarks, frame }: HistogramPanel): Panel => {
  const { bins, counts } = returns;
  const [low, high] = [bins[0]?.from ?? 0, bins.at(-1)?.to ?? 0];
  const x = within([
    Math.min(low, ...landmarks.map(({ value }) => value - landmarkRoom * (high - low))),
    high,
  ]);
  const axis = { labelExpr: signed('+~%'), title: null, tickCount: 6, grid: false };
  const count = { type: 'quantitative' as const, title: null, axis: { ...sideAxis(frame), tickCount: 3 } };
  const corner = { orient: 'top-right', direction: 'vertical', symbolType: 'stroke', offset: 0 };
  return {
    title: head,
    width: frame.plot,
    height: histogramHeight,
    layer: [
      {
        data: { values: bins.map(({ from, to, count: days }) => ({ from, to, days })) },
        mark: { type: 'rect', color: colours.fill, stroke: colours.ground, strokeWidth: 0.5 },
        encoding: {
          x: { field: 'from', ...x, axis },
          x2: { field: 'to' },
          y: { field: 'days', ...count },
          y2: { datum: 0 },
        },
      },
      {
        data: {
          values: curveRows(
            counts,
            ({ value }) => value,
            (each) => each,
          ),
        },
        mark: { type: 'line', strokeWidth: 2 },
        encoding: {
          x: { field: 'x', ...x },
          y: { field: 'y', ...count },
          ...curveLegend(corner),
        },
      },
      ...landmarkLayers(landmarks, x),
    ],
  };
};

export type LossPanel = {
  readonly head: string;
  readonly returns: Pick<ReturnPicture, 'losses' | 'curve'>;
  readonly domain: Domain;
  readonly landmarks: readonly Landmark[];
  readonly frame: PlotFrame;
  /** null where an axis below says it. */
  readonly axisTitle: string | null;
};

/** Where nothing was lost, what the fitted distributions say of losses is shown from here on. */
const leastShareWithoutLosses = 0.001;

/** The share axis begins at half the share of the largest loss, and ends above the curves. */
const shareDomain = (shares: readonly number[], curvesBegin: number): Domain => [
  Math.min(...(shares.length === 0 ? [leastShareWithoutLosses] : shares)) / 2,
  Math.max(...shares, curvesBegin, 2 * leastShareWithoutLosses) * 1.1,
];

/** The labels of the share axis, for the room that they take. */
export const shareLabels = ['0.01%', '10%'] as const;

/** The loss side magnified: the share of days that lost at least as much, on a scale of powers of ten. */
export const lossPanel = ({ head, returns, domain, landmarks, frame, axisTitle }: LossPanel): Panel => {
  const { losses, curve } = returns;
  const rows = curveRows(
    curve,
    ({ loss }) => loss,
    (each) => each,
  );
  const shares = shareDomain(
    losses.map(({ share }) => share),
    Math.max(curve[0]?.normal ?? 0, curve[0]?.student ?? 0),
  );
  const x = within(domain);
  const y = {
    type: 'quantitative' as const,
    scale: { type: 'log' as const, domain: [...shares], nice: false },
    axis: { ...sideAxis(frame), values: [0.1, 0.01, 0.001, 0.0001], labelExpr: "format(datum.value, '~%')" },
    title: null,
  };
  return {
    title: head,
    width: frame.plot,
    height: lossHeight,
    layer: [
      {
        data: { values: losses.map((each) => ({ ...each })) },
        mark: { type: 'point', filled: true, opacity: 1, size: 26, color: colours.quiet },
        encoding: {
          x: { field: 'loss', ...x, axis: { labelExpr: signed('~%'), title: axisTitle, tickCount: 6 } },
          y: { field: 'share', ...y },
        },
      },
      {
        data: {
          values: [...untilTheyLeave(rows, domain[1], shares[0])],
        },
        mark: { type: 'line', strokeWidth: 2 },
        encoding: { x: { field: 'x', ...x }, y: { field: 'y', ...y }, ...curveLegend(null) },
      },
      ...landmarkLayers(landmarks, x),
    ],
  };
};
