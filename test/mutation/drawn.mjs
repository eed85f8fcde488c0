import { createHash } from 'node:crypto';

/**
 * A share of the mutants to try, for a machine that has no time for all. Which ones follows from their place and
 * text alone, so a greater share holds the smaller one. `line` and `column` count from 0.
 */
const share = Number(process.env.MUTATION_SHARE ?? 1);

export const isDrawn = (path, { location, mutatorName, replacement }) => {
  const { start, end } = location;
  const text = [path, start.line, start.column, end.line, end.column, mutatorName, replacement].join('|');
  return createHash('sha256').update(text).digest().readUInt32BE() < share * 2 ** 32;
};
