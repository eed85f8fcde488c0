import { type DigitOptions, decimalsOfThree, digits, threeDigits } from './digits.ts';
import { type Bounded, decimalsOfBounds, type WrittenBounds, writeBounds } from './estimate.ts';

/** Decimal fractions become percent here and nowhere else. */
export const inPercent = (fraction: number): number => fraction * 100;

const scaled = (bounds: Bounded): Bounded => ({
  estimate: inPercent(bounds.estimate),
  lower: bounds.lower === null ? null : inPercent(bounds.lower),
  upper: bounds.upper === null ? null : inPercent(bounds.upper),
});

/** The decimals that percent figures of these decimal-fraction bounds take; landmarks are decimal fractions too. */
export const percentDecimals = (bounds: Bounded, landmarks: readonly number[] = [0]): number =>
  decimalsOfBounds(scaled(bounds), landmarks.map(inPercent));

/** Bounds given as decimal fractions, written as percent digits without the sign %. */
export const percentBounds = (
  bounds: Bounded,
  decimals: number = percentDecimals(bounds),
  options: Pick<DigitOptions, 'plus'> = { plus: true },
): WrittenBounds => writeBounds(scaled(bounds), decimals, options);

/** `+0.06%`. Without decimals given: three significant digits. */
export const percent = (fraction: number, decimals?: number, options: DigitOptions = {}): string => {
  const value = inPercent(fraction);
  return `${digits(value, decimals ?? decimalsOfThree(value), options)}%`;
};

/** Basis points with three significant digits: `35.8bp`. */
export const basisPoints = (fraction: number): string => `${threeDigits(fraction * 10_000)}bp`;

/** The digits that a person typed, no more and no fewer. */
const typedDigits = (value: number): string => {
  const exact = Number(value.toPrecision(10));
  return digits(exact, String(exact).split('.')[1]?.length ?? 0);
};

/** A size that a person typed: `20bp`, `12.34bp`. */
export const typedBasisPoints = (fraction: number): string => `${typedDigits(fraction * 10_000)}bp`;

/** A share that a person typed: `4%`, `97.5%`. */
export const typedPercent = (fraction: number): string => `${typedDigits(inPercent(fraction))}%`;

/** A level with just the digits it was asked with: `95%`, `97.5%`, `99.9%`. */
export const levelInWords = typedPercent;
