import { fixtureJson } from '../readFixture.ts';

type Row = Readonly<Record<string, number | string>>;

/** One row of check values: each figure as a double (fixtures hold them as text of 20 or 25 digits), and how to name it. */
export type Figures = { readonly of: (field: string) => number; readonly where: string };

const figuresOf = (row: Row): Figures => ({
  of: (field) => {
    const value = row[field];
    if (value === undefined) throw new Error(`no field ${field} in ${JSON.stringify(row)}`);
    return Number(value);
  },
  where: JSON.stringify(row),
});

const notEmpty = (rows: readonly Row[] | undefined, name: string): readonly Figures[] => {
  if (rows === undefined || rows.length === 0) throw new Error(`no rows of ${name}`);
  return rows.map(figuresOf);
};

const points = fixtureJson<Readonly<Record<string, readonly Row[]>>>('distribution-points.json');

/** mpmath 1.3.0 at points off any grid. */
export const pointRows = (group: string): readonly Figures[] => notEmpty(points[group], group);

type Case = { readonly name: string; readonly values: readonly Row[] };
type Cases = { readonly cases: readonly Case[] };

const grid = fixtureJson<Cases>('quantiles.json').cases;
const power = fixtureJson<Cases>('power-mean.json').cases;

/** mpmath 1.2.1 on the grid of quantiles.json. */
export const gridRows = (name: string): readonly Figures[] =>
  notEmpty(grid.find((entry) => entry.name === name)?.values, name);

/** mpmath 1.2.1: power and sample size of the one-sample t test. */
export const powerRows = (name: string, alternative: string): readonly Figures[] =>
  notEmpty(
    power.find((entry) => entry.name === name)?.values.filter((row) => row['alternative'] === alternative),
    alternative,
  );
