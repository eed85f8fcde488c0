import { existsSync, readFileSync } from 'node:fs';
import { betaQuantile } from '../../dist/stats/distributions/beta.js';
import { isDrawn } from './drawn.mjs';
import { endlessLoops, equivalents } from './equivalents.mjs';

const reportOf = (name) => `.stryker-tmp/reports/${name}.json`;

const inOneLine = (text) => text.replace(/\s+/g, ' ');

const isAmong = (list, file, line, { mutatorName, replacement }) =>
  list.some(
    (known) =>
      known.file === file &&
      line.includes(known.line) &&
      known.mutator === mutatorName &&
      inOneLine(known.replacement) === inOneLine(replacement),
  );

const fromZero = ({ start, end }) => ({
  start: { line: start.line - 1, column: start.column - 1 },
  end: { line: end.line - 1, column: end.column - 1 },
});

/** An endless loop is a kill only where a counter saw it turn or the list says so; what merely took too long is not. */
const outcomeOf = (file, line, mutant) => {
  if (mutant.status === 'NoCoverage' && !isDrawn(file, { ...mutant, location: fromZero(mutant.location) }))
    return 'notDrawn';
  if (mutant.status === 'Killed') return 'killed';
  if (mutant.status === 'RuntimeError') return 'notDrawn';
  if (isAmong(equivalents, file, line, mutant)) return 'equivalent';
  if (mutant.status !== 'Timeout') return 'survived';
  const isEndless = mutant.statusReason?.startsWith('Hit limit') || isAmong(endlessLoops, file, line, mutant);
  return isEndless ? 'endless' : 'tooLong';
};

const nothing = { notDrawn: 0, killed: 0, endless: 0, tooLong: 0, equivalent: 0, survived: 0 };

const countsOf = (report) => {
  const counts = { ...nothing };
  for (const [path, { source, mutants }] of Object.entries(report.files)) {
    const lines = source.split('\n');
    for (const mutant of mutants) counts[outcomeOf(path, lines[mutant.location.start.line - 1], mutant)] += 1;
  }
  return counts;
};

/** The interval of Clopper & Pearson at 95% for a share seen in a sample. */
const intervalOf = (hits, tried) => {
  const lower = hits === 0 ? 0 : betaQuantile(0.025, hits, tried - hits + 1);
  const upper = hits === tried ? 1 : betaQuantile(0.975, hits + 1, tried - hits);
  return `${(100 * lower).toFixed(1)} to ${(100 * upper).toFixed(1)}`;
};

const rowOf = (name, { notDrawn, killed, endless, tooLong, equivalent, survived }) => {
  const found = killed + endless;
  const judged = found + tooLong + survived;
  const interval = notDrawn === 0 ? 'whole' : intervalOf(found, judged);
  const counts = [judged + equivalent + notDrawn, judged + equivalent];
  const outcomes = [killed, endless, tooLong, survived, equivalent, ((100 * found) / judged).toFixed(1)];
  return `| ${[name, ...counts, ...outcomes, interval].join(' | ')} |`;
};

const sumOf = (rows) =>
  Object.fromEntries(Object.keys(nothing).map((key) => [key, rows.reduce((sum, row) => sum + row[key], 0)]));

/**
 * The table of the parts whose reports are at hand, with their sum. The score is (killed + endless) / (tried − equivalent);
 * where only a share was tried, its interval stands beside it.
 */
export const summaryOf = (names) => {
  const parts = names
    .filter((name) => existsSync(reportOf(name)))
    .map((name) => ({ name, counts: countsOf(JSON.parse(readFileSync(reportOf(name), 'utf8'))) }));
  return [
    '| part | mutants | tried | killed | endless | too long | survived | equivalent | score % | interval % |',
    '|---|---|---|---|---|---|---|---|---|---|',
    ...parts.map(({ name, counts }) => rowOf(name, counts)),
    rowOf('all', sumOf(parts.map(({ counts }) => counts))),
  ].join('\n');
};
