import { type Day, dayFromIso } from '../terms/day.ts';

/** The calendar day that it is in an IANA time zone at an instant. */
export const dayAt = (instantMs: number, timeZone: string): Day => {
  const iso = new Intl.DateTimeFormat('en-CA', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).format(instantMs);
  const day = dayFromIso(iso);
  if (day === null) throw new Error(`dayAt: the day ${iso} in ${timeZone} cannot be read`);
  return day;
};

const hourMs = 3_600_000;
const millisecondsPerDay = 24 * hourMs;

/** The instant at which a day begins in an IANA time zone: zones are whole quarters of an hour, 14 hours at most, from UTC. */
export const dayStartMs = (day: Day, timeZone: string): number => {
  let instantMs = day * millisecondsPerDay - 14 * hourMs;
  while (dayAt(instantMs, timeZone) < day) instantMs += hourMs / 4;
  return instantMs;
};
