import type { Exposure, Size } from '../../question.ts';

/** Enough to give back every number that can be typed, too few to show what a double cannot hold. */
const significantDigits = 12;

const plainDecimal = (value: number): string => {
  const text = String(Number(value.toPrecision(significantDigits)));
  return text.includes('e') ? value.toFixed(significantDigits).replace(/\.?0+$/, '') : text;
};

/** Basis points under 1%, percent from there on. */
export const writeFraction = (fraction: number): string =>
  Math.abs(fraction) < 0.01 ? `${plainDecimal(fraction * 10_000)}bp` : `${plainDecimal(fraction * 100)}%`;

export const writeSize = ({ fraction, per }: Size): string =>
  `${writeFraction(fraction)}${per === 'year' ? ' a year' : ''}`;

export const writeRatio = ({ fraction, per }: Size): string =>
  `${plainDecimal(fraction)}${per === 'year' ? ' a year' : ''}`;

const magnitudes = [
  [1e9, 'bn'],
  [1e6, 'm'],
  [1e3, 'k'],
] as const;

/** `2m`, `2.5m`, `1234567`: the largest unit in which at most three decimals are needed. */
const writeAmount = (amount: number): string => {
  const unit = magnitudes.find(([size]) => Math.abs(amount) >= size && amount % (size / 1000) === 0);
  return unit === undefined ? plainDecimal(amount) : `${plainDecimal(amount / unit[0])}${unit[1]}`;
};

export const writeExposure = (exposure: Exposure): string => {
  if (exposure.kind === 'shares') return `on ${writeAmount(exposure.shares)} shares`;
  return `on ${writeAmount(exposure.amount)}${exposure.currency === null ? '' : ` ${exposure.currency}`}`;
};
