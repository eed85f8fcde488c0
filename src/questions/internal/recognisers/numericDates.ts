import { type Day, dateParts, dayFromDate, isoFromDay } from '../../../terms/day.ts';

/** The latest day before today with this month and day of the month; null where no year has it. */
export const latestBefore = (today: Day, month: number, dayOfMonth: number): Day | null => {
  const { year } = dateParts(today);
  // eight years back there has always been a 29 February, even across 2100
  for (let back = 0; back <= 8; back += 1) {
    const day = dayFromDate(year - back, month, dayOfMonth);
    if (day !== null && day < today) return day;
  }
  return null;
};

const parted = /^(\d{1,4})([./-])(\d{1,2})(?:\2(\d{1,4}))?$/;
const basic = /^(\d{4})(\d{2})(\d{2})$/;

/** Whether a word of digits looks like a date that is not written as ISO 8601 has it. */
export const looksLikeDate = (text: string): boolean =>
  /^\d{1,4}([./-])\d{1,2}\1\d{1,4}$/.test(text) || /^\d{1,2}\/\d{1,2}$/.test(text);

const fullYear = (year: string): number => (year.length <= 2 ? 2000 + Number(year) : Number(year));

const candidates = (text: string, today: Day): readonly (Day | null)[] => {
  const undivided = basic.exec(text);
  if (undivided !== null)
    return [dayFromDate(Number(undivided[1]), Number(undivided[2]), Number(undivided[3]))];
  const parts = parted.exec(text);
  const [first, second, third] = [parts?.[1] ?? '', parts?.[3] ?? '', parts?.[4]];
  if (third === undefined)
    return [
      latestBefore(today, Number(second), Number(first)),
      latestBefore(today, Number(first), Number(second)),
    ];
  if (first.length === 4) return [dayFromDate(Number(first), Number(second), Number(third))];
  const year = fullYear(third);
  return [dayFromDate(year, Number(second), Number(first)), dayFromDate(year, Number(first), Number(second))];
};

/** The ISO dates that a numeric date may mean: day first, then month first, where both exist. */
export const isoReadings = (text: string, today: Day): readonly string[] => [
  ...new Set(candidates(text, today).flatMap((day) => (day === null ? [] : [isoFromDay(day)]))),
];
