/** A value as numerator / 2^scaleBits, exact for every finite double down to 2^-scaleBits. */
const scaleBits = 120;

const exactInteger = (value: number): bigint => {
  let mantissa = value;
  let shift = scaleBits;
  while (!Number.isInteger(mantissa)) {
    mantissa *= 2;
    shift -= 1;
  }
  return BigInt(mantissa) << BigInt(shift);
};

export type Fraction = { readonly numerator: bigint; readonly denominator: bigint };

/** actual/exact − 1 by size, where `actual` is a double; exact arithmetic up to the last division. */
export const exactRelativeError = (actual: number, exact: Fraction): number => {
  const unit = 1n << BigInt(scaleBits);
  const difference = exactInteger(actual) * exact.denominator - exact.numerator * unit;
  const scaled = (difference * 10n ** 40n) / (exact.numerator * unit);
  return Math.abs(Number(scaled)) / 1e40;
};

/** The same for the square of `actual` against the exact square, halved: the relative error of a square root. */
export const exactRelativeErrorOfRoot = (actual: number, exactSquare: Fraction): number => {
  const square = exactInteger(actual) ** 2n;
  const unit = 1n << BigInt(2 * scaleBits);
  const difference = square * exactSquare.denominator - exactSquare.numerator * unit;
  const scaled = (difference * 10n ** 40n) / (exactSquare.numerator * unit);
  return Math.abs(Number(scaled)) / 2e40;
};

/** Mean, sample variance (n − 1) and lag-1 autocorrelation of the doubles as they are, in rational arithmetic. */
export const exactMoments = (values: readonly number[]) => {
  const integers = values.map(exactInteger);
  const count = BigInt(values.length);
  const sum = integers.reduce((total, value) => total + value, 0n);
  const scaledDeviations = integers.map((value) => value * count - sum);
  const squares = scaledDeviations.reduce((total, value) => total + value * value, 0n);
  const lagged = scaledDeviations
    .slice(1)
    .reduce((total, value, index) => total + value * (scaledDeviations[index] ?? 0n), 0n);
  return {
    mean: { numerator: sum, denominator: count << BigInt(scaleBits) },
    sampleVariance: {
      numerator: squares,
      denominator: (count * count * (count - 1n)) << BigInt(2 * scaleBits),
    },
    lag1Autocorrelation: { numerator: lagged, denominator: squares },
  };
};
