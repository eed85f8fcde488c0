const months = [
  'january',
  'february',
  'march',
  'april',
  'may',
  'june',
  'july',
  'august',
  'september',
  'october',
  'november',
  'december',
] as const;

const weekdays = ['monday', 'tuesday', 'wednesday', 'thursday', 'friday', 'saturday', 'sunday'] as const;

/** The full names and their first three letters, and two shortenings of four that are as usual. */
const numbered = (names: readonly string[]): readonly (readonly [string, number])[] =>
  names.flatMap((name, index): [string, number][] => [
    [name, index + 1],
    [name.slice(0, 3), index + 1],
  ]);

export const monthNumbers: ReadonlyMap<string, number> = new Map([...numbered(months), ['sept', 9]]);

/** ISO 8601 weekday numbers: Monday is 1. */
export const weekdayNumbers: ReadonlyMap<string, number> = new Map([
  ...numbered(weekdays),
  ['tues', 2],
  ['thurs', 4],
]);

export const calendarWords: readonly string[] = [...monthNumbers.keys(), ...weekdayNumbers.keys()];

export const monthName = (month: number): string => {
  const name = months[month - 1] ?? '';
  return name.charAt(0).toUpperCase() + name.slice(1);
};

/** `mon` for 1: ISO 8601 weekday numbers as schedules write them. */
export const weekdayWord = (weekday: number): string => (weekdays[weekday - 1] ?? '').slice(0, 3);
