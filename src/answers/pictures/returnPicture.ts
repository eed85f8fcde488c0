import { type BothFitted, bothFitted, type Fitted } from './fitted.ts';
import type {
  CountCurvePoint,
  HistogramBin,
  LossCurvePoint,
  LossShare,
  ReturnPicture,
} from './pictureData.ts';

const mostBins = 60;
const fewestBins = 8;

/** 1, 2 or 5 times a power of ten, not above the width wanted. */
const roundWidth = (wanted: number): number => {
  const power = 10 ** Math.floor(Math.log10(wanted) + 1e-9);
  return ([5, 2].find((times) => times * power <= wanted * (1 + 1e-9)) ?? 1) * power;
};

/** Freedman & Diaconis (1981): twice the interquartile range over the cube root of the count. */
const binWidth = (ascending: Float64Array): number => {
  const count = ascending.length;
  const at = (share: number): number => ascending[Math.floor(share * (count - 1))] as number;
  const range = at(1) - at(0);
  const wanted = (2 * (at(0.75) - at(0.25))) / Math.cbrt(count);
  return roundWidth(Math.min(Math.max(wanted, range / mostBins), range / fewestBins));
};

/** Edges are whole multiples of the width, so that zero is one of them. */
const binsOf = (ascending: Float64Array, width: number): readonly HistogramBin[] => {
  const first = Math.floor((ascending[0] as number) / width);
  const last = Math.floor((ascending[ascending.length - 1] as number) / width);
  const counts = new Int32Array(last - first + 1);
  for (const value of ascending) {
    const place = Math.floor(value / width) - first;
    counts[place] = (counts[place] as number) + 1;
  }
  return Array.from(counts, (count, place) => ({
    from: (first + place) * width,
    to: (first + place + 1) * width,
    count,
  }));
};

/** Values at even distances, both ends included. */
const grid = (from: number, to: number, points: number): readonly number[] =>
  Array.from({ length: points }, (_, step) => from + ((to - from) * step) / (points - 1));

const curvePoints = 80;

const countsOf = (
  bins: readonly HistogramBin[],
  width: number,
  count: number,
  { normal, student }: BothFitted,
): readonly CountCurvePoint[] => {
  const expected = ({ shareBelow }: Fitted, value: number): number =>
    count * (shareBelow(value + width / 2) - shareBelow(value - width / 2));
  return grid(bins[0]?.from ?? 0, bins.at(-1)?.to ?? 0, curvePoints).map((value) => ({
    value,
    normal: expected(normal, value),
    student: student === null ? null : expected(student, value),
  }));
};

/** The loss side of a picture begins where a quarter of the days lost as much. */
const magnifiedShare = 0.25;

const lossesOf = (ascending: Float64Array): readonly LossShare[] =>
  Array.from(ascending.subarray(0, Math.max(1, Math.floor(magnifiedShare * ascending.length))))
    .map((value, place) => ({ loss: 0 - value, share: (place + 1) / ascending.length }))
    .filter(({ loss }) => loss > 0);

const curveOf = (from: number, to: number, { normal, student }: BothFitted): readonly LossCurvePoint[] =>
  grid(from, to, curvePoints).map((loss) => ({
    loss,
    normal: normal.shareLosing(loss),
    student: student?.shareLosing(loss) ?? null,
  }));

/** How far the loss side goes beyond the largest loss, or the largest figure. */
const headroom = 1.5;

/** The histogram and the loss side of these returns; the loss side reaches at least to the figures named. */
export const returnPicture = (returns: Float64Array, figures: readonly number[]): ReturnPicture => {
  const ascending = returns.slice().sort();
  const fitted = bothFitted(returns);
  const width = binWidth(ascending);
  const bins = binsOf(ascending, width);
  const losses = lossesOf(ascending);
  const from = Math.max(0, losses.at(-1)?.loss ?? 0);
  const to = headroom * Math.max(losses[0]?.loss ?? 0, ...figures);
  return {
    bins,
    counts: countsOf(bins, width, returns.length, fitted),
    losses,
    curve: curveOf(from, to, fitted),
  };
};
