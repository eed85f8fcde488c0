import { ewmaDecay } from '../../../volatility/ewma.ts';
import type { TailNote } from '../../tailFigures.ts';
import type { FilterSource } from './filterSource.ts';

/** `nextDayDeviation` in the units of the returns; omega in their square. */
export type FilteredTailParameters =
  | { readonly kind: 'ewma'; readonly nextDayDeviation: number; readonly lambda: number }
  | {
      readonly kind: 'garch';
      readonly nextDayDeviation: number;
      readonly mu: number;
      readonly omega: number;
      readonly alpha: number;
      /** Null where no volatility clustering was found; omega is then the variance of every day. */
      readonly beta: number | null;
      /** Infinity where the residuals are normal. */
      readonly nu: number;
    };

export const describeFilter = ({ fit, state }: FilterSource): FilteredTailParameters => {
  const nextDayDeviation = Math.sqrt(state.nextVariance);
  if (fit === null) return { kind: 'ewma', nextDayDeviation, lambda: ewmaDecay };
  const { mu, omega, alpha, beta, nu } = fit;
  return { kind: 'garch', nextDayDeviation, mu, omega, alpha, beta, nu };
};

/** What a reader must know of the fit beside its figures. */
export const filterNotes = ({ fit }: FilterSource): readonly TailNote[] => {
  const notes: TailNote[] = [];
  const note = (code: TailNote['code'], text: string) =>
    notes.push({ figure: 'parameters', code, text, needs: null });
  if (fit === null) return notes;
  if (!fit.clustering)
    note(
      'noClustering',
      'No volatility clustering was found: alpha is 0, and every day has the same variance.',
    );
  if (fit.beta === 0)
    note('parameterOnBound', 'beta ended on 0 and was held there: volatility remembers the last day alone.');
  if (fit.normalLimit)
    note('normalLimit', 'The residuals are no fatter than the bell curve: nu is infinite, the normal limit.');
  return notes;
};
