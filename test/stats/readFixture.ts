import { readFileSync } from 'node:fs';

const fixtures = new URL('../fixtures/', import.meta.url);

export const fixtureText = (path: string): string => readFileSync(new URL(path, fixtures), 'utf8');

/** A fixture as the shape the test expects of it; a file of another shape makes the test fail. */
export const fixtureJson = <T>(path: string): T => JSON.parse(fixtureText(path));

/** Closes of one index in file order, oldest first. */
export const indexCloses = (ticker: string): number[] =>
  fixtureText('eu-indices/eu-indices.csv')
    .split('\n')
    .map((line) => line.trim().split(','))
    .filter((cells) => cells[1] === ticker)
    .map((cells) => Number(cells[2]));
