import type { InstantMs } from '../terms/clock.ts';
import type { Day } from '../terms/day.ts';
import { instantOf, localTimeAt } from '../terms/zonedTime.ts';

/** The calendar day that it is in an IANA time zone at an instant. */
export const dayAt = (instantMs: InstantMs, timeZone: string): Day => localTimeAt(instantMs, timeZone).day;

/** The instant at which a day begins in an IANA time zone. */
export const dayStartMs = (day: Day, timeZone: string): InstantMs => instantOf({ day, minutes: 0 }, timeZone);
