import { z } from 'zod';
import { type Level, levelFraction, levelFromFraction, levelFromPercent } from '../terms/level.ts';
import type { Window } from '../terms/window.ts';

type Reader<Value> = (text: string) => Value | null;

/** A text or number that `read` turns into a value; null from `read` makes a problem. The wording comes with the setting. */
const readFrom = <Value>(read: Reader<Value>) =>
  z.union([z.string(), z.number()]).transform((written, context): Value => {
    const value = read(String(written).trim());
    if (value !== null) return value;
    context.issues.push({ code: 'custom', message: 'unreadable', input: written });
    return z.NEVER;
  });

const readLevel: Reader<Level> = (text) =>
  text.endsWith('%') ? levelFromPercent(text.slice(0, -1).trimEnd()) : levelFromFraction(text);

/** A level such as `95%`; the fraction `0.95` is read too, a bare 95 is not. */
export const probability = readFrom(readLevel);

export const levelOfAtLeastHalf = readFrom((text): Level | null => {
  const level = readLevel(text);
  return level !== null && levelFraction(level) >= 0.5 ? level : null;
});

const spanUnits = { w: 'week', m: 'month', y: 'year' } as const;
const mostReturns = 1_000_000;

const readWindow: Reader<Window> = (text) => {
  if (text === 'all') return { kind: 'all' };
  const parts = /^([1-9]\d{0,6})([dwmy])$/.exec(text);
  const amount = Number(parts?.[1]);
  const unit = parts?.[2];
  if (!(amount <= mostReturns)) return null;
  if (unit === 'd') return { kind: 'returns', count: amount };
  return unit === 'w' || unit === 'm' || unit === 'y'
    ? { kind: 'span', amount, unit: spanUnits[unit] }
    : null;
};

/** A window that needs no date: `60d`, `12w`, `3m`, `2y`, `all`. */
export const defaultWindow = readFrom(readWindow);

const largestSize = 0.1;

/** A size above zero such as `5bp` or `0.05%`, as a decimal fraction. */
export const decimalSize = readFrom((text): number | null => {
  const parts = /^(\d{1,4}(?:\.\d{1,6})?)\s?(bp|%)$/.exec(text);
  if (parts === null) return null;
  const fraction = Number(parts[1]) / (parts[2] === 'bp' ? 10_000 : 100);
  return fraction > 0 && fraction <= largestSize ? fraction : null;
});

/** A time such as `08:30`, as minutes after midnight. */
export const timeOfDay = readFrom((text): number | null => {
  const parts = /^([01]?\d|2[0-3]):([0-5]\d)$/.exec(text);
  return parts === null ? null : Number(parts[1]) * 60 + Number(parts[2]);
});

const isZone = (zone: string): boolean => {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: zone }).format(0) !== '';
  } catch {
    // the engine's one way of saying that it does not know a zone
    return false;
  }
};

export const ianaZone = z.string().refine(isZone);

const localTimePattern = /^([01]\d|2[0-3]):[0-5]\d (\S+)$/;

/** `17:30 Europe/London`. */
export const localTimeAndZone = z.string().refine((text) => isZone(localTimePattern.exec(text)?.[2] ?? ''));

export const currencyCode = z.string().regex(/^[A-Z]{3}$/);
