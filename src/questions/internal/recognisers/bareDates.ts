import { dayFromIso, isoFromDay } from '../../../terms/day.ts';
import { dateAt } from './dates.ts';
import { looksLikeDate } from './numericDates.ts';
import { faultAt, found, foundFault, type Line, type Recogniser } from './recogniser.ts';

const intervalShape = /^(\d{4}-\d{2}-\d{2})\/(\d{4}-\d{2}-\d{2})$/;

/** An ISO 8601 interval, `2026-01-02/2026-03-31`: both ends belong to it. */
export const isoInterval: Recogniser = (line, at) => {
  const parts = intervalShape.exec(line.words[at]?.text ?? '');
  if (parts === null) return null;
  const [from, to] = [dayFromIso(parts[1] ?? ''), dayFromIso(parts[2] ?? '')];
  if (from === null || to === null) return wrongInterval(line, at, 'holds a day that does not exist.', ['']);
  if (from > to) {
    const turned = `${parts[2] ?? ''}/${parts[1] ?? ''}`;
    return wrongInterval(line, at, 'ends before it begins. Put the earlier day first.', [turned]);
  }
  if (from > line.context.today)
    return wrongInterval(line, at, `begins after today, ${isoFromDay(line.context.today)}.`, ['']);
  return found({ kind: 'window', window: { kind: 'between', from, to } }, 1);
};

const wrongInterval = (line: Line, at: number, says: string, instead: readonly string[]) =>
  foundFault(faultAt(line, at, 1, { code: 'badDate', says, instead }), 1);

/** A date on its own does not say which side of it is meant. */
export const bareDate: Recogniser = (line, at) => {
  const text = line.words[at]?.text ?? '';
  const named = /^\d{1,2}(?:st|nd|rd|th)?$/i.test(text);
  if (!named && !looksLikeDate(text) && !/^\d{4}-\d{2}-\d{2}$/.test(text)) return null;
  const date = dateAt(line, at);
  if (date === null || !date.ok) return date === null ? null : foundFault(date.fault, date.wordCount);
  const iso = isoFromDay(date.day);
  const says = 'is a day, not a window. Put since, before or after in front of it.';
  const fault = faultAt(line, at, date.wordCount, {
    code: 'ambiguous',
    says,
    instead: [`since ${iso}`, `before ${iso}`],
  });
  return foundFault(fault, date.wordCount);
};
