import type { NeedWidth } from '../../../answers/pictures/pictureData.ts';
import { colours } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { plotFrame, roomy, sideAxis } from './axes.ts';
import type { Landmark } from './strips.ts';

const height = 210;

export type WidthPanel = {
  readonly head: string;
  readonly widths: readonly NeedWidth[];
  readonly wanted: Landmark;
  /** Two counts of days; the smaller is named on its left. */
  readonly counts: readonly Landmark[];
};

/** Both scales in powers of ten: four times the days, half the width. */
export const widthPanel = ({ head, widths, wanted, counts }: WidthPanel): Panel => {
  const frame = plotFrame(['0.001%']);
  const x = { type: 'quantitative' as const, scale: { type: 'log' as const, nice: false } };
  const y = {
    type: 'quantitative' as const,
    scale: { type: 'log' as const, nice: false },
    title: null,
    axis: {
      ...sideAxis(frame),
      tickCount: 4,
      labelExpr: "format(datum.value, '~%')",
      labelOverlap: 'greedy' as const,
    },
  };
  const axis = { title: 'trading days', tickCount: 4, format: ',d', grid: false, ...roomy };
  const least = Math.min(...counts.map(({ value }) => value));
  return {
    title: head,
    width: frame.plot,
    height,
    layer: [
      {
        data: { values: widths.map((each) => ({ ...each })) },
        mark: { type: 'line', color: colours.blue, strokeWidth: 2.5 },
        encoding: { x: { field: 'returnCount', ...x, axis }, y: { field: 'halfWidth', ...y } },
      },
      {
        data: { values: [{ ...wanted }] },
        mark: { type: 'rule', color: colours.ink, strokeDash: [4, 3] },
        encoding: { y: { field: 'value', ...y } },
      },
      ...counts.flatMap(({ value, label }, place) => [
        {
          data: { values: [{ value }] },
          mark: { type: 'rule' as const, color: colours.ink, strokeWidth: 1.5 },
          encoding: { x: { field: 'value', ...x } },
        },
        {
          data: { values: [{ value, label }] },
          mark: {
            type: 'text' as const,
            baseline: 'top' as const,
            align: value === least && place === 0 ? ('right' as const) : ('left' as const),
            dx: value === least && place === 0 ? -4 : 4,
          },
          encoding: { x: { field: 'value', ...x }, y: { value: place * 18 + 2 }, text: { field: 'label' } },
        },
      ]),
    ],
  };
};
