import type { TailModelName } from '../tails/tailFigures.ts';

/** How the returns of a simulation were made; DEVELOPERS and the table's own tests state the parameters. */
export const coverageProcesses = {
  normal: 'independent normal returns',
  studentT4: 'independent returns of Student’s distribution with 4 degrees of freedom',
  studentT3: 'independent returns of Student’s distribution with 3 degrees of freedom',
  exponential: 'independent returns of the (very lopsided) exponential distribution',
  autoregressive: 'normal returns that each keep 0.3 of the one before',
  garchT: 'GARCH(1,1) returns with α 0.08, β 0.90 and Student innovations with 5 degrees of freedom',
} as const;

export type CoverageProcess = keyof typeof coverageProcesses;

/**
 * Every interval whose coverage is measured, named figure first. Tail figures carry their tail level, `tail.student.var.0.99`,
 * and chances of a loss the true chance at which they were measured, `beyond.student.0.01`.
 */
export type CoveredInterval =
  | `mean.${'plain' | 'normal' | 'neweyWest' | 'studentised' | 'stationary' | 'trusted' | 'prediction'}`
  | `deviation.${'chiSquare' | 'bonett' | 'block' | 'trusted'}`
  | 'ratio.noncentralT'
  | `compare.${'paired' | 'welch'}.${'mean' | 'deviationRatio'}`
  | `beyond.${TailModelName}.${string}`
  | 'tail.student.nu'
  | `tail.${TailModelName}.${'var' | 'es'}.${string}`;

/**
 * One measured cell: interval, process, count of returns, confidence level as a decimal, share of the intervals that
 * held the truth, simulated samples, and how many of them were refused an interval (and are left out of the share).
 */
export type CoverageCell = readonly [
  interval: CoveredInterval,
  process: CoverageProcess,
  count: number,
  level: string,
  coverage: number,
  replications: number,
  refused: number,
];
