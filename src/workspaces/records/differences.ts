import type { Answers } from '../../answers/answer.ts';

/** One value of an answer that came out otherwise. */
export type ValueDifference = { readonly path: string; readonly before: string; readonly after: string };

const shown = (value: unknown): string => (value === undefined ? 'missing' : JSON.stringify(value));

const isTree = (value: unknown): value is Readonly<Record<string, unknown>> =>
  typeof value === 'object' && value !== null;

const walk = (before: unknown, after: unknown, path: string): readonly ValueDifference[] => {
  if (!isTree(before) || !isTree(after))
    return shown(before) === shown(after) ? [] : [{ path, before: shown(before), after: shown(after) }];
  const keys = new Set([...Object.keys(before), ...Object.keys(after)]);
  return [...keys].flatMap((key) => walk(before[key], after[key], path === '' ? key : `${path}.${key}`));
};

/** Every figure that differs, by its path and with all its digits. */
export const figureDifferences = (before: Answers, after: Answers): readonly ValueDifference[] =>
  walk(
    before.map(({ figures }) => figures),
    // as it comes back from JSON, where −0 is 0
    JSON.parse(JSON.stringify(after.map(({ figures }) => figures))),
    '',
  );
