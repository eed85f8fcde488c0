import { editDistance } from '../terms/nearest.ts';

const longestCompared = 40;

/** A word is never said to be close to one that differs in more than half of its letters. */
const mostEdits = (word: string): number => Math.max(1, Math.floor(word.length / 2));

/** How far the candidate is from the word: one that begins with the word, or the other way round, counts as one edit away. */
const distanceTo = (word: string, candidate: string, most: number): number => {
  if (candidate === word) return 0;
  const prefixed =
    Math.min(word.length, candidate.length) >= 2 &&
    (candidate.startsWith(word) || word.startsWith(candidate));
  if (prefixed) return 1;
  return Math.abs(word.length - candidate.length) > most ? most + 1 : editDistance(word, candidate);
};

/**
 * The candidates closest to a word, at most `count`, the closest first and equals in alphabetical order; those
 * that have little in common with it are left out. For an empty word: the first candidates.
 * Example: `closestWords('KELQ', ['TARN', 'KELP'], 2)` is `['KELP']`.
 */
export const closestWords = (
  word: string,
  candidates: readonly string[],
  count: number,
): readonly string[] => {
  if (word === '') return candidates.slice(0, count);
  const wanted = word.slice(0, longestCompared).toLowerCase();
  const most = mostEdits(wanted);
  return candidates
    .map((candidate) => ({ candidate, distance: distanceTo(wanted, candidate.toLowerCase(), most) }))
    .filter(({ distance }) => distance <= most)
    .sort(
      (first, second) => first.distance - second.distance || (first.candidate < second.candidate ? -1 : 1),
    )
    .slice(0, count)
    .map(({ candidate }) => candidate);
};
