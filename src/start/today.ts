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
