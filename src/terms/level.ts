/**
 * A probability kept as the decimal that was typed: `digits / 10^places`. 97.5% is `{ digits: 975, places: 3 }`.
 * Everything that is counted from a level comes from these whole numbers, so that 0.95 of 100 is 95 and not 94.99….
 */
export type Level = { readonly digits: number; readonly places: number };

const maxPlaces = 12;

/** The level written as a plain decimal fraction such as `0.975`; null unless it lies strictly inside (0, 1). */
export const levelFromFraction = (text: string): Level | null => levelFromDecimal(text, 0);

/** The level written as a percentage without its sign, such as `97.5`; null unless it lies strictly inside (0, 100). */
export const levelFromPercent = (text: string): Level | null => levelFromDecimal(text, 2);

const levelFromDecimal = (text: string, shift: number): Level | null => {
  const parts = /^(\d{0,3})(?:\.(\d{1,10}))?$/.exec(text);
  if (parts === null || text === '') return null;
  const decimals = (parts[2] ?? '').replace(/0+$/, '');
  let digits = Number(`${parts[1] ?? ''}${decimals}`);
  let places = decimals.length + shift;
  while (places > 1 && digits % 10 === 0 && digits > 0) {
    digits /= 10;
    places -= 1;
  }
  if (places > maxPlaces || digits <= 0 || digits >= 10 ** places) return null;
  return { digits, places };
};

/** The level as a double, correctly rounded: 0.975. */
export const levelFraction = (level: Level): number => level.digits / 10 ** level.places;

/** One minus the level, from whole numbers: 0.025 for 97.5%. */
export const tailFraction = (level: Level): number =>
  (10 ** level.places - level.digits) / 10 ** level.places;

/** Half of one minus the level: the probability beyond each end of a two-sided interval. */
export const halfTailFraction = (level: Level): number =>
  (10 ** level.places - level.digits) / (2 * 10 ** level.places);

/** ⌈n·level⌉ for a whole n, exact. */
export const ceilingOfCount = (count: number, level: Level): number => {
  const scale = 10n ** BigInt(level.places);
  return Number((BigInt(count) * BigInt(level.digits) + scale - 1n) / scale);
};

/** count·(1 − level) as a double, one rounding: the number of returns expected beyond the level. */
export const expectedBeyond = (count: number, level: Level): number => {
  const scale = 10 ** level.places;
  return (count * (scale - level.digits)) / scale;
};

/** The least count for which `beyond` returns are expected beyond the level: ⌈beyond/(1 − level)⌉, for a whole `beyond`. */
export const countWithBeyond = (level: Level, beyond: number): number => {
  const scale = 10n ** BigInt(level.places);
  const tail = scale - BigInt(level.digits);
  return Number((BigInt(beyond) * scale + tail - 1n) / tail);
};

/** The least count for which one return is expected beyond the level: ⌈1/(1 − level)⌉. */
export const leastCountBeyond = (level: Level): number => countWithBeyond(level, 1);

/** The level as people write it: `97.5%`. */
export const levelText = (level: Level): string => {
  const wholeAndDecimals = level.digits.toString().padStart(level.places + 1, '0');
  const point = wholeAndDecimals.length - level.places;
  const padded = `${wholeAndDecimals}00`;
  const percentPoint = point + 2;
  const whole = padded.slice(0, percentPoint).replace(/^0+(?=\d)/, '');
  const decimals = padded.slice(percentPoint).replace(/0+$/, '');
  return `${whole}${decimals === '' ? '' : `.${decimals}`}%`;
};

/** Levels are kept in lowest form, so equal levels have equal parts. */
export const sameLevel = (first: Level, second: Level): boolean =>
  first.digits === second.digits && first.places === second.places;
