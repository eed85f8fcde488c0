import { type DigitOptions, decimalsFromHalfWidth, digits, roundTo } from './digits.ts';

/** An estimate between bounds in one screen unit; a null bound is an open end. */
export type Bounded = {
  readonly estimate: number;
  readonly lower: number | null;
  readonly upper: number | null;
};

export type WrittenBounds = {
  readonly estimate: string;
  readonly lower: string | null;
  readonly upper: string | null;
  readonly decimals: number;
};

const mostDecimals = 12;

const halfWidthOf = ({ estimate, lower, upper }: Bounded): number => {
  if (lower !== null && upper !== null) return (upper - lower) / 2;
  if (lower !== null) return estimate - lower;
  return upper === null ? 0 : upper - estimate;
};

/** True where rounding outward would write a bound that is off a landmark as if it lay on it or across. */
const hidesLandmark = (bounds: Bounded, decimals: number, landmark: number): boolean => {
  const { lower, upper } = bounds;
  const lowerHides = lower !== null && lower > landmark && roundTo(lower, decimals, 'down') <= landmark;
  const upperHides = upper !== null && upper < landmark && roundTo(upper, decimals, 'up') >= landmark;
  return lowerHides || upperHides;
};

/**
 * The decimals for an estimate and its bounds: set by the half-width rounded to two significant digits, and one more as
 * long as rounding would turn the verdict about a landmark (zero, a claimed value).
 */
export const decimalsOfBounds = (bounds: Bounded, landmarks: readonly number[] = [0]): number => {
  let decimals = decimalsFromHalfWidth(halfWidthOf(bounds));
  while (decimals < mostDecimals && landmarks.some((landmark) => hidesLandmark(bounds, decimals, landmark)))
    decimals += 1;
  return decimals;
};

/** Estimate rounded to nearest, bounds rounded outward, all with the same decimals. */
export const writeBounds = (
  bounds: Bounded,
  decimals: number = decimalsOfBounds(bounds),
  options: Pick<DigitOptions, 'plus'> = { plus: true },
): WrittenBounds => ({
  estimate: digits(bounds.estimate, decimals, options),
  lower: bounds.lower === null ? null : digits(bounds.lower, decimals, { ...options, rounding: 'down' }),
  upper: bounds.upper === null ? null : digits(bounds.upper, decimals, { ...options, rounding: 'up' }),
  decimals,
});
