/** How many decimals and which rounding: the one place where a double becomes digits on a screen. */

const trueMinus = '−';

/** Guards outward rounding against a figure that is a whole multiple of the step but for its last bits. */
const wholeTolerance = 1e-9;

/** The power of ten of the leading digit after rounding to `significant` digits: 0.0996 to two digits leads at −1 (0.10). */
const leadingPower = (value: number, significant: number): number => {
  const magnitude = Math.abs(value);
  const power = Math.floor(Math.log10(magnitude));
  const scaled = magnitude / 10 ** (power - significant + 1);
  return Math.round(scaled) >= 10 ** significant ? power + 1 : power;
};

/**
 * The decimals at which a half-width, already in its screen unit, shows two significant digits: 0.275 → 2, 12.4 → 0.
 * Estimate and bounds are then written with as many. A half-width of zero is written with `fallback` decimals.
 */
export const decimalsFromHalfWidth = (halfWidth: number, fallback = 2): number =>
  halfWidth === 0 || !Number.isFinite(halfWidth) ? fallback : Math.max(0, 1 - leadingPower(halfWidth, 2));

/** The decimals at which a figure without an interval shows three significant digits. */
export const decimalsOfThree = (value: number): number =>
  value === 0 || !Number.isFinite(value) ? 0 : Math.max(0, 2 - leadingPower(value, 3));

export type Rounding = 'nearest' | 'down' | 'up';

const roundedSteps = (steps: number, rounding: Rounding): number => {
  const nearest = Math.round(steps);
  if (rounding === 'nearest' || Math.abs(steps - nearest) <= wholeTolerance * Math.max(1, Math.abs(steps)))
    return nearest;
  return rounding === 'down' ? Math.floor(steps) : Math.ceil(steps);
};

/** The figure rounded to `decimals`; `down` and `up` mean towards minus and plus infinity. */
export const roundTo = (value: number, decimals: number, rounding: Rounding = 'nearest'): number => {
  const scale = 10 ** decimals;
  return roundedSteps(value * scale, rounding) / scale;
};

export type DigitOptions = { readonly rounding?: Rounding; readonly plus?: boolean };

/** Digits with a true minus sign and thousands set apart by a thin comma; `plus` writes + before what is above zero. */
export const digits = (value: number, decimals: number, options: DigitOptions = {}): string => {
  const rounded = roundTo(value, decimals, options.rounding);
  const [whole = '', fraction] = Math.abs(rounded).toFixed(decimals).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, ',');
  const body = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  if (rounded < 0) return `${trueMinus}${body}`;
  return options.plus === true && rounded > 0 ? `+${body}` : body;
};

/** `count` significant digits; whole numbers beyond them keep zeros: 0.0412, 3.21, 41,200 with three. */
export const significant = (value: number, count: number, options: DigitOptions = {}): string => {
  if (value === 0) return '0';
  const power = leadingPower(value, count);
  if (power < count) return digits(value, count - 1 - power, options);
  const step = 10 ** (power - count + 1);
  return digits(Math.round(value / step) * step, 0, options);
};

/** Three significant digits, for figures without an interval. */
export const threeDigits = (value: number, options: DigitOptions = {}): string =>
  significant(value, 3, options);

/** Six significant digits, for the steps of a working. */
export const workingDigits = (value: number): string => significant(value, 6);
