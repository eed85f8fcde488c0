import type { BacktestPath } from '../../../answers/pictures/pictureData.ts';
import { colours } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { type PlotFrame, sideAxis, signed, within } from './axes.ts';
import { dayAxis } from './days.ts';

const pathHeight = 170;
const countHeight = 130;

/** First and last day of the path. */
const spanOf = ({ steps }: BacktestPath): readonly [number, number] => [
  steps[0]?.day ?? 0,
  steps.at(-1)?.day ?? 0,
];

/** Returns as sticks, the figure of each day as a line below zero, exceedances marked. */
export const pathPanel = (path: BacktestPath, head: string, frame: PlotFrame): Panel => {
  const [first, last] = spanOf(path);
  const x = within([first, last]);
  const y = {
    type: 'quantitative' as const,
    title: null,
    axis: { ...sideAxis(frame), labelExpr: signed('+~%'), tickCount: 5 },
  };
  return {
    title: head,
    width: frame.plot,
    height: pathHeight,
    layer: [
      {
        data: {
          values: path.steps.map(({ day, low, high }) => ({
            at: day,
            from: Math.min(0, low),
            to: Math.max(0, high),
          })),
        },
        mark: { type: 'rule', color: colours.border, strokeWidth: 1 },
        encoding: {
          x: { field: 'at', ...x, axis: dayAxis(first, last) },
          y: { field: 'from', ...y },
          y2: { field: 'to' },
        },
      },
      {
        data: {
          values: path.steps.flatMap(({ day, valueAtRisk }) =>
            valueAtRisk === null ? [] : [{ at: day, level: 0 - valueAtRisk }],
          ),
        },
        mark: { type: 'line', color: colours.blue, strokeWidth: 2, interpolate: 'step-after' },
        encoding: { x: { field: 'at', ...x }, y: { field: 'level', ...y } },
      },
      {
        data: { values: path.exceedances.map(({ day, value }) => ({ at: day, value })) },
        mark: {
          type: 'point',
          shape: 'triangle-down',
          filled: true,
          opacity: 1,
          size: 75,
          color: colours.vermillion,
        },
        encoding: { x: { field: 'at', ...x }, y: { field: 'value', ...y } },
      },
    ],
  };
};

/** How the count of exceedances grew, against what chance alone allows. */
export const countPanel = (path: BacktestPath, head: string, frame: PlotFrame): Panel => {
  const [first, last] = spanOf(path);
  const x = within([first, last]);
  const y = {
    type: 'quantitative' as const,
    title: null,
    axis: { ...sideAxis(frame), tickMinStep: 1, tickCount: 4, format: 'd' },
  };
  const values = path.counts.map(({ day, ...each }) => ({ at: day, ...each }));
  const encodingX = { field: 'at', ...x, axis: dayAxis(first, last) };
  return {
    title: head,
    width: frame.plot,
    height: countHeight,
    data: { values },
    layer: [
      {
        mark: { type: 'area', color: colours.fill, opacity: 0.6, interpolate: 'step-after' },
        encoding: { x: encodingX, y: { field: 'lower', ...y }, y2: { field: 'upper' } },
      },
      {
        mark: { type: 'line', color: colours.quiet, strokeDash: [4, 3], strokeWidth: 1.5 },
        encoding: { x: encodingX, y: { field: 'expected', ...y } },
      },
      {
        mark: { type: 'line', color: colours.vermillion, strokeWidth: 2.5, interpolate: 'step-after' },
        encoding: { x: encodingX, y: { field: 'count', ...y } },
      },
    ],
  };
};
