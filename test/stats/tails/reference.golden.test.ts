import { describe, expect, it } from 'vitest';
import { historicalTail } from '../../../src/stats/tails/historicalTail.ts';
import { normalTail } from '../../../src/stats/tails/normalTail.ts';
import { studentTail } from '../../../src/stats/tails/studentTail.ts';
import { leastCountBeyond } from '../../../src/terms/level.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';
import { testStreams } from '../testStreams.ts';

type Pair = { readonly var: number; readonly es: number };

type ReferenceCase = {
  readonly ticker: string;
  readonly window: string;
  readonly n: number;
  readonly historical_var_es: Readonly<
    Record<string, { readonly var_type1: number; readonly es_weighted_tail: number }>
  >;
  readonly normal_var_es: Readonly<Record<string, Pair>>;
  readonly student_t_fit: { readonly nu: number | 'infinity' };
  readonly fitted_t_var_es: Readonly<Record<string, Pair>>;
};

const { cases } = fixtureJson<{ readonly cases: readonly ReferenceCase[] }>('eu-indices/reference.json');
const windows = cases.filter((each) => each.normal_var_es !== undefined && each.n >= 20);
const levels = ['0.95', '0.975', '0.99'] as const;

/** Rounding of a sum of n terms, and of a return taken from two prices, against 40 digits. */
const close = 1e-12;

describe('VaR and ES of index windows, against mpmath 1.2.1 at 40 digits (eu-indices/reference.json)', () => {
  it('has cases to compare', () => {
    expect(windows.length).toBe(8);
  });

  for (const each of windows)
    for (const fraction of levels) {
      const input = {
        returns: indexReturns(each.ticker, each.window),
        tailLevel: level(fraction),
        confidence: level95,
        streams: testStreams(1),
      };

      it(`historical: ${each.ticker} over ${each.window} at ${fraction}`, () => {
        const expected = each.historical_var_es[fraction];
        if (each.n < leastCountBeyond(input.tailLevel)) {
          expect(historicalTail(input)).toMatchObject({ ok: false, problem: { code: 'notEnoughTail' } });
          return;
        }
        const figures = accepted(historicalTail(input));
        expect(relativeError(figures.var, expected?.var_type1 ?? Number.NaN)).toBeLessThan(close);
        expect(
          relativeError(figures.es ?? Number.NaN, expected?.es_weighted_tail ?? Number.NaN),
        ).toBeLessThan(close);
      });

      it(`normal: ${each.ticker} over ${each.window} at ${fraction}`, () => {
        const expected = each.normal_var_es[fraction];
        const figures = accepted(normalTail(input));
        expect(relativeError(figures.var, expected?.var ?? Number.NaN)).toBeLessThan(close);
        expect(relativeError(figures.es ?? Number.NaN, expected?.es ?? Number.NaN)).toBeLessThan(close);
      });

      it(`student: ${each.ticker} over ${each.window} at ${fraction}`, () => {
        const expected = each.fitted_t_var_es[fraction];
        const figures = accepted(studentTail(input));
        // the fit itself is good to 1e-11 on its flattest window
        expect(relativeError(figures.var, expected?.var ?? Number.NaN)).toBeLessThan(1e-11);
        expect(relativeError(figures.es ?? Number.NaN, expected?.es ?? Number.NaN)).toBeLessThan(1e-11);
      });
    }
});
