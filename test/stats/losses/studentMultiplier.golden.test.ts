import { describe, expect, it } from 'vitest';
import { quantileMultiplier, shortfallMultiplier } from '../../../src/stats/losses/studentMultiplier.ts';
import { fillByDifferences, type SmoothValue } from '../../../src/stats/numerics/smoothValue.ts';
import { normalTail } from '../../../src/stats/tails/normalTail.ts';
import { levelFromFraction, tailFraction } from '../../../src/terms/level.ts';
import { accepted } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { level, level95 } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';
import { testStreams } from '../testStreams.ts';

type Row = Readonly<Record<string, string | number>>;
type Quantiles = { readonly cases: readonly { readonly name: string; readonly values: readonly Row[] }[] };

const rowsOf = (name: string): readonly Row[] =>
  fixtureJson<Quantiles>('quantiles.json').cases.find((each) => each.name === name)?.values ?? [];

const tailOf = (row: Row): number => tailFraction(level(String(row.level)));

describe('VaR and ES in scales, against mpmath 1.2.1 at 60 digits (quantiles.json)', () => {
  const student = rowsOf('student_t_var_es');
  const normal = rowsOf('normal_var_es');

  it('has cases to compare', () => {
    expect(student.length).toBe(40);
    expect(normal.length).toBe(5);
    for (const row of [...student, ...normal]) expect(levelFromFraction(String(row.level))).not.toBeNull();
  });

  it('agrees for Student t to 1e-12', () => {
    for (const row of student) {
      const nu = Number(row.nu);
      expect(relativeError(quantileMultiplier(tailOf(row), nu), Number(row.var_t))).toBeLessThan(1e-12);
      expect(relativeError(shortfallMultiplier(tailOf(row), nu), Number(row.es_t))).toBeLessThan(1e-12);
    }
  });

  it('agrees for the normal limit to 1e-12', () => {
    const infinite = Number.POSITIVE_INFINITY;
    for (const row of normal) {
      expect(relativeError(quantileMultiplier(tailOf(row), infinite), Number(row.var))).toBeLessThan(1e-12);
      expect(relativeError(shortfallMultiplier(tailOf(row), infinite), Number(row.es))).toBeLessThan(1e-12);
    }
  });
});

type Examples = {
  readonly cases: readonly {
    readonly name: string;
    readonly values?: readonly {
      readonly level: number;
      readonly var_normal: number;
      readonly es_normal: number;
      readonly var_student_t4: number;
      readonly es_student_t4: number;
    }[];
  }[];
};

/** A portfolio of 10,000 with 20% annual volatility over 250 days, mean 0. */
describe('The stock portfolio of McNeil, Frey & Embrechts 2005, section 2.2 (risk-worked-examples.json, recomputed)', () => {
  const rows =
    fixtureJson<Examples>('risk-worked-examples.json').cases.find(
      (each) => each.name === 'normal_and_student_t4_var_es',
    )?.values ?? [];
  const portfolio = 10_000;
  const daily = 0.2 / Math.sqrt(250);

  it('has five levels', () => {
    expect(rows.length).toBe(5);
  });

  it('has the normal VaR and ES, from returns with just that mean and deviation', () => {
    const size = daily * Math.sqrt(249 / 250); // half up, half down: sample deviation size·√(250/249)
    const returns = Float64Array.from({ length: 250 }, (_, index) => (index % 2 === 0 ? size : -size));
    for (const row of rows) {
      const tailLevel = level(String(row.level));
      const figures = accepted(
        normalTail({ returns, tailLevel, confidence: level95, streams: testStreams(1) }),
      );
      expect(relativeError(portfolio * figures.var, row.var_normal)).toBeLessThan(1e-12);
      expect(relativeError(portfolio * (figures.es ?? Number.NaN), row.es_normal)).toBeLessThan(1e-12);
    }
  });

  it('has the t(4) VaR and ES at the same variance', () => {
    const scale = portfolio * daily * Math.sqrt(2 / 4);
    for (const row of rows) {
      const tail = tailFraction(level(String(row.level)));
      expect(relativeError(scale * quantileMultiplier(tail, 4), row.var_student_t4)).toBeLessThan(1e-12);
      expect(relativeError(scale * shortfallMultiplier(tail, 4), row.es_student_t4)).toBeLessThan(1e-12);
    }
  });
});

describe('Differences in 1/nu', () => {
  const into: SmoothValue = { value: 0, slope: 0, curvature: 0 };

  it('reproduce a smooth function inside and next to the normal limit', () => {
    for (const inverseNu of [0, 5e-5, 0.25, 1.5]) {
      fillByDifferences((nu) => Math.exp(1 / nu), inverseNu, into);
      expect(into.value).toBe(Math.exp(inverseNu));
      // truncation step²/6 of the slope (step² next to the limit) and rounding ε/step; curvature step and ε/step²
      expect(relativeError(into.slope, Math.exp(inverseNu))).toBeLessThan(1e-7);
      expect(relativeError(into.curvature, Math.exp(inverseNu))).toBeLessThan(2e-4);
    }
  });

  it('have the slope of the quantile at the normal limit: (z³ + z)/4 (Abramowitz & Stegun 1964, 26.7.5)', () => {
    const z = 2.3263478740408408;
    fillByDifferences((nu) => quantileMultiplier(0.01, nu), 0, into);
    expect(relativeError(into.slope, (z ** 3 + z) / 4)).toBeLessThan(1e-6);
  });
});
