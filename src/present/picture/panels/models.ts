import { colours } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { type Domain, type PlotFrame, sideAxis, signed, within } from './axes.ts';

/** A figure with its interval, on the upper or the lower of the two lines of its model’s row. */
export type ModelMark = {
  readonly name: string;
  readonly line: 'upper' | 'lower';
  readonly estimate: number;
  readonly lower: number | null;
  readonly upper: number | null;
};

const rowHeight = 26;
const lines = {
  upper: { yOffset: -5, color: colours.blue, shape: 'circle' },
  lower: { yOffset: 5, color: colours.vermillion, shape: 'diamond' },
} as const;

/** The part of an interval that lies in the plot; an end that does not, or that there is not, is at the edge. */
const clippedTo = (marks: readonly ModelMark[], [low, high]: Domain) =>
  marks
    .filter(({ lower, upper }) => lower !== null || upper !== null)
    .map(({ name, lower, upper }) => ({
      name,
      from: Math.max(low, lower ?? low),
      to: Math.min(high, upper ?? high),
    }));

const goingOn = (marks: readonly ModelMark[], [, high]: Domain) =>
  marks
    .filter(({ lower, upper }) => (upper === null && lower !== null) || (upper !== null && upper > high))
    .map(({ name }) => ({ name, at: high }));

export type ModelPanel = {
  readonly head: string;
  readonly names: readonly string[];
  readonly marks: readonly ModelMark[];
  readonly domain: Domain;
  readonly frame: PlotFrame;
  readonly axisTitle: string;
};

/** Two figures of each model with their intervals, one line above the other; a bar that goes on beyond the edge has an arrow. */
export const modelPanel = ({ head, names, marks, domain, frame, axisTitle }: ModelPanel): Panel => {
  const x = within(domain);
  const axis = { labelExpr: signed('~%'), title: axisTitle, tickCount: 6 };
  const y = {
    field: 'name',
    type: 'nominal' as const,
    sort: [...names],
    scale: { domain: [...names] },
    title: null,
    axis: sideAxis(frame),
  };
  return {
    title: head,
    width: frame.plot,
    height: names.length * rowHeight,
    layer: (['upper', 'lower'] as const).flatMap((line) => {
      const { yOffset, color, shape } = lines[line];
      const some = marks.filter((each) => each.line === line);
      return [
        {
          data: { values: clippedTo(some, domain) },
          mark: { type: 'rule' as const, strokeWidth: 4, color, yOffset, y2Offset: yOffset },
          encoding: { x: { field: 'from', ...x, axis }, x2: { field: 'to' }, y },
        },
        {
          data: { values: goingOn(some, domain) },
          mark: {
            type: 'point' as const,
            filled: true,
            opacity: 1,
            size: 70,
            shape: 'triangle-right',
            color,
            yOffset,
          },
          encoding: { x: { field: 'at', ...x }, y },
        },
        {
          data: { values: some.map(({ name, estimate }) => ({ name, estimate })) },
          mark: {
            type: 'point' as const,
            filled: true,
            opacity: 1,
            size: 75,
            shape,
            color: colours.ink,
            stroke: colours.ground,
            strokeWidth: 1,
            yOffset,
          },
          encoding: { x: { field: 'estimate', ...x }, y },
        },
      ];
    }),
  };
};
