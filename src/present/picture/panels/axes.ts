import { sheetMargin, sheetWidth, sizes } from '../look.ts';
import { textWidth } from '../metrics.ts';

/** An axis label in a notation of the grammar; zero has no sign and no unit. */
export const signed = (format: string): string =>
  `abs(datum.value) < 1e-12 ? '0' : format(datum.value, '${format}')`;

/** Labels that would touch are left out. */
export const roomy = { labelOverlap: 'greedy' as const, labelSeparation: 10, labelFlush: false };

/** Room on the right for the half of the last label that reaches beyond the plot. */
const rightRoom = 18;

/** The room that the labels of the vertical axis take, the same in all panels of a picture, and what is left for the plot. */
export type PlotFrame = { readonly labels: number; readonly plot: number };

export const plotFrame = (labels: readonly string[]): PlotFrame => {
  const widest = Math.max(...labels.map((label) => textWidth(label, { fontSize: sizes.label })));
  const room = Math.ceil(widest) + 12;
  return { labels: room, plot: sheetWidth - 2 * sheetMargin - room - rightRoom };
};

/** About as long as the longest label of a percent axis that reaches this far: small values take many decimals. */
export const percentLabel = (reach: number): string => {
  const percent = Math.max(1e-12, 100 * reach);
  const decimals = Math.max(0, Math.ceil(1 - Math.log10(percent)));
  return `−${percent.toFixed(Math.min(20, decimals))}%`;
};

/** The axis beside a plot: no line of its own, labels in their fixed room. */
export const sideAxis = ({ labels }: PlotFrame) => ({
  domain: false,
  ticks: false,
  minExtent: labels,
  maxExtent: labels,
});

/** From the least to the largest of the values, with a margin on either side. */
export type Domain = readonly [number, number];

const edge = 0.04;

export const domainOf = (values: readonly (number | null)[]): Domain => {
  const known = values.filter((value): value is number => value !== null);
  const [low, high] = [Math.min(...known), Math.max(...known)];
  const margin = edge * (high - low || Math.abs(high) || 1);
  return [low - margin, high + margin];
};

/** A quantitative scale that begins and ends where it is told. */
export const within = (domain: Domain) => ({
  type: 'quantitative' as const,
  scale: { domain: [...domain], nice: false, zero: false },
});
