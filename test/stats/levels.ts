import { type Level, levelFromFraction } from '../../src/terms/level.ts';

/** A level for a test, from its decimal; a test that misspells one fails at once. */
export const level = (text: string): Level => {
  const read = levelFromFraction(text);
  if (read === null) throw new Error(`not a level: ${text}`);
  return read;
};

export const level95 = level('0.95');
