/** The least number of single-character insertions, deletions, replacements and swaps of neighbours between two words. */
export const editDistance = (first: string, second: string): number => {
  let beforeLast: number[] = [];
  let last = Array.from({ length: second.length + 1 }, (_, column) => column);
  for (let row = 1; row <= first.length; row += 1) {
    const current = [row];
    for (let column = 1; column <= second.length; column += 1) {
      const same = first[row - 1] === second[column - 1];
      let least = Math.min(
        (last[column] ?? 0) + 1,
        (current[column - 1] ?? 0) + 1,
        (last[column - 1] ?? 0) + (same ? 0 : 1),
      );
      const swapped =
        row > 1 &&
        column > 1 &&
        first[row - 1] === second[column - 2] &&
        first[row - 2] === second[column - 1];
      if (swapped) least = Math.min(least, (beforeLast[column - 2] ?? 0) + 1);
      current.push(least);
    }
    beforeLast = last;
    last = current;
  }
  return last[second.length] ?? 0;
};

/** The candidate closest to `word` whatever the case, if it is close enough to be a likely slip of the hand; else null. */
export const nearestWord = (word: string, candidates: readonly string[]): string | null => {
  const most = Math.max(1, Math.floor(word.length / 2));
  let best: string | null = null;
  let leastDistance = most + 1;
  for (const candidate of candidates) {
    const distance = editDistance(word.toLowerCase(), candidate.toLowerCase());
    if (distance < leastDistance) {
      best = candidate;
      leastDistance = distance;
    }
  }
  return best;
};
