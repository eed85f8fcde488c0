import { existsSync, readFileSync } from 'node:fs';
import { equivalents } from './equivalents.mjs';

const reportOf = (name) => `.stryker-tmp/reports/${name}.json`;

const isEquivalent = (file, line, { mutatorName, replacement }) =>
  equivalents.some(
    (known) =>
      known.file === file &&
      line.includes(known.line) &&
      known.mutator === mutatorName &&
      known.replacement === replacement,
  );

/** An endless loop is a kill only where a counter saw it turn; one that merely took too long is not. */
const outcomeOf = (file, line, mutant) => {
  if (mutant.status === 'Killed') return 'killed';
  if (mutant.status === 'Timeout')
    return mutant.statusReason?.startsWith('Hit limit') ? 'endless' : 'tooLong';
  return isEquivalent(file, line, mutant) ? 'equivalent' : 'survived';
};

const countsOf = (report) => {
  const counts = { mutants: 0, killed: 0, endless: 0, tooLong: 0, equivalent: 0, survived: 0 };
  for (const [path, { source, mutants }] of Object.entries(report.files)) {
    const lines = source.split('\n');
    for (const mutant of mutants.filter(
      ({ status }) => !['Ignored', 'CompileError', 'RuntimeError'].includes(status),
    )) {
      counts.mutants += 1;
      counts[outcomeOf(path, lines[mutant.location.start.line - 1], mutant)] += 1;
    }
  }
  return counts;
};

const rowOf = (name, { mutants, killed, endless, tooLong, equivalent, survived }) => {
  const score = (100 * (killed + endless)) / (mutants - equivalent);
  return `| ${[name, mutants, killed, endless, tooLong, equivalent, survived, score.toFixed(1)].join(' | ')} |`;
};

/** The table of the parts whose reports are at hand, with their sum. */
export const summaryOf = (names) => {
  const rows = names
    .filter((name) => existsSync(reportOf(name)))
    .map((name) => ({ name, counts: countsOf(JSON.parse(readFileSync(reportOf(name), 'utf8'))) }));
  const total = { mutants: 0, killed: 0, endless: 0, tooLong: 0, equivalent: 0, survived: 0 };
  for (const { counts } of rows) for (const key of Object.keys(total)) total[key] += counts[key];
  return [
    '| part | mutants | killed | endless | too long | equivalent | survived | score % |',
    '|---|---|---|---|---|---|---|---|',
    ...rows.map(({ name, counts }) => rowOf(name, counts)),
    rowOf('all', total),
  ].join('\n');
};
