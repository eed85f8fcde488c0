import { type Level, levelFromFraction, levelFromPercent } from '../../../terms/level.ts';
import type { Piece } from '../pieces/piece.ts';
import { decimalOf, quantityAt } from '../words/numbers.ts';
import type { Word } from '../words/word.ts';
import { type Complaint, faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

export const percentUnits: ReadonlyMap<string, '%'> = new Map([
  ['%', '%'],
  ['percent', '%'],
]);

/** The level written at some words, null where the figure is outside the range of levels. */
type LevelFound = { readonly level: Level | null; readonly wordCount: number };

/** `95%`, and where a word before it says that a level follows also `95` and `0.95`. */
const levelAt = (words: readonly Word[], at: number): LevelFound | null => {
  const percent = quantityAt(words, at, percentUnits);
  if (percent !== null) return { level: levelFromPercent(percent.decimal), wordCount: percent.wordCount };
  const decimal = decimalOf(words[at]);
  if (decimal === null) return null;
  const level = Number(decimal) < 1 ? levelFromFraction(decimal) : levelFromPercent(decimal);
  return { level, wordCount: 1 };
};

const usualLevels = ['95%', '99%'] as const;

export const levelOutside = (before: string): Complaint => ({
  code: 'levelOutside',
  says: 'is not a level. Give more than 0% and less than 100%.',
  instead: usualLevels.map((level) => `${before} ${level}`),
});

const levelMissing = (word: string): Complaint => ({
  code: 'missingPart',
  says: `needs a level after it, such as ${word} 95%.`,
  instead: [''],
});

/** A level with a word before it that says what it is for. */
const markedLevel =
  (pieceOf: (level: Level) => Piece): Recogniser =>
  (line, at) => {
    const word = line.words[at]?.lower ?? '';
    const read = levelAt(line.words, at + 1);
    if (read === null) return foundFault(faultAt(line, at, 1, levelMissing(word)), 1);
    const wordCount = read.wordCount + 1;
    if (read.level === null) return foundFault(faultAt(line, at, wordCount, levelOutside(word)), wordCount);
    return found(pieceOf(read.level), wordCount);
  };

export const level = markedLevel((value) => ({ kind: 'level', level: value }));

export const confidence = markedLevel((value) => ({ kind: 'confidence', level: value }));

export const power = markedLevel((value) => ({ kind: 'power', level: value }));

/** `95%` on its own: a level or a size, as the verb has it. */
export const percent: Recogniser = (line, at) => {
  const quantity = quantityAt(line.words, at, percentUnits);
  return quantity === null ? null : found({ kind: 'percent', decimal: quantity.decimal }, quantity.wordCount);
};
