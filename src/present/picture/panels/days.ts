import { addMonths, type Day, dateParts, dayFromDate } from '../../../terms/day.ts';
import { roomy } from './axes.ts';

/**
 * Days across a picture. They are numbers of days to the grammar, whose own instants would need the machine's zone; where
 * the labels stand follows from the calendar.
 */
const mostLabels = 6;
const monthSteps = [1, 2, 3, 6, 12, 24, 60, 120, 240, 600, 1200] as const;
const dayStep = 14;
/** Below this span months are too far apart to be labels. */
const shortSpanDays = 75;

const firstOfMonth = (day: Day): Day => {
  const { year, month } = dateParts(day);
  return dayFromDate(year, month, 1) ?? day;
};

/** First days of months, a whole number of steps from January, so that years are among them where the step allows. */
const monthTicks = (first: Day, last: Day, step: number): readonly Day[] => {
  const { year, month } = dateParts(first);
  const january = addMonths(firstOfMonth(first), 1 - month);
  const aligned = step > 12 ? addMonths(january, -12 * (year % (step / 12))) : january;
  const ticks: Day[] = [];
  for (let day = aligned; day <= last; day = addMonths(day, step)) if (day >= first) ticks.push(day);
  return ticks;
};

/** Where an axis of days from the first to the last is labelled, and in which notation of the grammar. */
export const dayTicks = (
  first: Day,
  last: Day,
): { readonly days: readonly Day[]; readonly format: string } => {
  if (last - first < shortSpanDays) {
    const count = Math.floor((last - first) / dayStep) + 1;
    return { days: Array.from({ length: count }, (_, place) => first + place * dayStep), format: '%-d %b' };
  }
  const step = monthSteps.find((each) => monthTicks(first, last, each).length <= mostLabels) ?? 1200;
  return { days: monthTicks(first, last, step), format: step >= 12 ? '%Y' : '%b %Y' };
};

const millisecondsPerDay = 86_400_000;

export const dayAxis = (first: Day, last: Day) => {
  const { days, format } = dayTicks(first, last);
  return {
    values: [...days],
    labelExpr: `utcFormat(datum.value * ${millisecondsPerDay}, '${format}')`,
    title: null,
    ...roomy,
  };
};
