import { amountWords, exposure } from './amounts.ts';
import { bareDate, isoInterval } from './bareDates.ts';
import { bareNumber } from './bareNumbers.ts';
import { calendarWords } from './calendarWords.ts';
import { estimation } from './estimation.ts';
import { filler, fillerWords, perPeriod } from './fillers.ts';
import { horizon } from './horizons.ts';
import { id } from './ids.ts';
import { confidence, level, percent, power } from './levels.ts';
import { model } from './models.ts';
import { plainWords } from './plainWords.ts';
import type { Found, Line, Recogniser } from './recogniser.ts';
import { scheduleDayWords } from './schedule/days.ts';
import { doingWords } from './schedule/doings.ts';
import { since } from './since.ts';
import { basisPoints, beyond, sizeUnitWords } from './sizes.ts';
import { splitDay } from './splitDay.ts';
import { ticker } from './tickers.ts';
import { wholeHistory, windowLength, windowUnitWords, yearToDate } from './windows.ts';
import { wish } from './wishes.ts';

type Keyworded = { readonly words: readonly string[]; readonly recognise: Recogniser };

/** Recognisers by the words they begin with; where two share a word the first that finds something wins. */
const keyworded: readonly Keyworded[] = [
  { words: ['since'], recognise: since },
  { words: ['before', 'after'], recognise: splitDay },
  { words: ['ytd'], recognise: yearToDate },
  { words: ['all'], recognise: wholeHistory },
  { words: ['at'], recognise: level },
  { words: ['confidence'], recognise: confidence },
  { words: ['power'], recognise: power },
  { words: ['beyond'], recognise: beyond },
  { words: ['over'], recognise: horizon },
  { words: ['on'], recognise: estimation },
  { words: ['on'], recognise: exposure },
  { words: ['by'], recognise: model },
  { words: ['as'], recognise: wish },
  { words: ['a'], recognise: perPeriod },
  ...plainWords,
  { words: fillerWords, recognise: filler },
];

/** Recognisers of what begins with a digit, a sign or a point, in the order in which they are tried. */
const figures: readonly Recogniser[] = [
  isoInterval,
  windowLength,
  basisPoints,
  percent,
  bareDate,
  bareNumber,
];

/** What is left when no word of the language fits. */
const names: readonly Recogniser[] = [id, ticker];

const byKeyword = new Map<string, Recogniser[]>();
for (const { words, recognise } of keyworded)
  for (const word of words) byKeyword.set(word, [...(byKeyword.get(word) ?? []), recognise]);

/** Words that mean something beside the verbs. A ticker that equals one of them is written in back-ticks. */
export const languageWords: ReadonlySet<string> = new Set([
  ...byKeyword.keys(),
  ...windowUnitWords,
  ...sizeUnitWords,
  ...amountWords,
  ...calendarWords,
  ...scheduleDayWords,
  ...doingWords,
  'loss',
  'losses',
  'utc',
  'window',
  'picture',
  'json',
]);

const noRecognisers: readonly Recogniser[] = [];

const beginsFigure = /^[\d+.-]/;

const firstFound = (recognisers: readonly Recogniser[], line: Line, at: number): Found | null => {
  for (const recognise of recognisers) {
    const read = recognise(line, at);
    if (read !== null) return read;
  }
  return null;
};

/** What stands at a word of the line, by the words of the language first, then figures, then names. */
export const recogniseAt: Recogniser = (line, at) => {
  const word = line.words[at];
  if (word === undefined) return null;
  if (word.quoted) return ticker(line, at);
  return (
    firstFound(byKeyword.get(word.lower) ?? noRecognisers, line, at) ??
    firstFound(beginsFigure.test(word.text) ? figures : noRecognisers, line, at) ??
    firstFound(names, line, at)
  );
};

/** How many words from `at` on are filler: none, one, or two for `a day`. */
export const fillerLength = (line: Line, at: number): number => {
  const read = recogniseAt(line, at);
  return read?.piece.kind === 'filler' ? read.wordCount : 0;
};

/** Where the first word stands that is no filler; the number of words where all are. */
export const leadingPlace = (line: Line): number => {
  let at = 0;
  for (let skipped = fillerLength(line, at); skipped > 0; skipped = fillerLength(line, at)) at += skipped;
  return at;
};

export const isOnlyFiller = (line: Line): boolean => leadingPlace(line) === line.words.length;
