import { colours, sheetMargin, sheetWidth } from '../look.ts';
import type { Panel } from '../sheet.ts';
import { type Domain, percentLabel, plotFrame, roomy, signed, within } from './axes.ts';

export type QuantilePlot = {
  readonly head: string;
  readonly axisTitle: string;
  readonly shape: 'circle' | 'triangle-up';
  readonly colour: string;
  readonly points: readonly { readonly expected: number; readonly observed: number }[];
};

const between = 22;
const plotHeight = 210;

const single = (
  { head, axisTitle, shape, colour, points }: QuantilePlot,
  domain: Domain,
  { labels, width }: { readonly labels: number; readonly width: number },
  first: boolean,
) => {
  const scale = within(domain);
  const axis = { labelExpr: signed('+~%'), tickCount: 3, ...roomy };
  const side = first
    ? { ...axis, title: null, domain: false, ticks: false, minExtent: labels, maxExtent: labels }
    : { ...axis, title: null, domain: false, ticks: false, labels: false };
  return {
    title: head,
    width,
    height: plotHeight,
    layer: [
      {
        data: { values: domain.map((end) => ({ end })) },
        mark: { type: 'line' as const, color: colours.ink, strokeWidth: 1.5, strokeDash: [4, 3] },
        encoding: { x: { field: 'end', ...scale }, y: { field: 'end', ...scale } },
      },
      {
        data: {
          values: points
            .filter(({ expected }) => expected >= domain[0] && expected <= domain[1])
            .map((each) => ({ ...each })),
        },
        mark: {
          type: 'point' as const,
          shape,
          filled: shape === 'circle',
          color: colour,
          opacity: 1,
          size: 28,
          strokeWidth: 1.5,
        },
        encoding: {
          x: { field: 'expected', ...scale, axis: { ...axis, title: axisTitle } },
          y: { field: 'observed', ...scale, axis: side },
        },
      },
    ],
  };
};

/** Observed returns against those expected at their rank, one or two plots beside each other on the same scales. */
export const quantilePanel = (plots: readonly QuantilePlot[], domain: Domain): Panel => {
  const { labels } = plotFrame([percentLabel(Math.max(-domain[0], domain[1]))]);
  const room = sheetWidth - 2 * sheetMargin - labels - between;
  const width = Math.floor((room - (plots.length - 1) * between) / plots.length);
  return {
    hconcat: plots.map((plot, place) => single(plot, domain, { labels, width }, place === 0)),
    spacing: between,
  };
};
