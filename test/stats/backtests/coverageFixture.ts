import { type Level, levelFromFraction } from '../../../src/terms/level.ts';
import { fixtureJson } from '../readFixture.ts';

type Named = { readonly name: string; readonly values: readonly unknown[] };

/** The values of one case of the coverage fixture, in the shape that the test expects of them. */
export const coverageCase = <T>(name: string): readonly T[] => {
  const found = fixtureJson<{ readonly cases: readonly (Named & { readonly values: readonly T[] })[] }>(
    'coverage.json',
  ).cases.find((one) => one.name === name);
  if (found === undefined) throw new Error(`coverage.json has no case ${name}`);
  return found.values;
};

/** 0.01 → the level 99%. Three decimals are enough for every failure probability of the fixture. */
export const levelOfFailure = (probability: number): Level => {
  const level = levelFromFraction((1 - probability).toFixed(3));
  if (level === null) throw new Error(`no level has the failure probability ${probability}`);
  return level;
};
