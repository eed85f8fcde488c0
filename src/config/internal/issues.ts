import type { z } from 'zod';
import { nearestWord } from '../../terms/nearest.ts';
import { anyTicker, type SettingHelp, settingsHelp } from '../help.ts';
import type { RuleBreach } from '../rules.ts';

type Breach = Omit<RuleBreach, 'value'> & { readonly value: string | null };
type Path = readonly PropertyKey[];

const valueAt = (written: unknown, path: Path): unknown =>
  path.reduce<unknown>(
    (value, key) => (typeof value === 'object' && value !== null ? Reflect.get(value, key) : undefined),
    written,
  );

const longestShown = 60;

/** Tokens belong in the environment; one that was written here by mistake must not reach a log. */
const looksSecret = /xox[a-z]|xapp|[0-9a-f]{32}|:\/\/\S*@/i;
const nameOfSecret = /token|secret|password|url$/i;

const shown = (value: unknown): string | null => {
  if (value === undefined) return null;
  const text = typeof value === 'string' ? `“${value}”` : JSON.stringify(value);
  if (looksSecret.test(text) || nameOfSecret.test(text)) return '(not shown)';
  return text.length > longestShown ? `${text.slice(0, longestShown)}…` : text;
};

/** The path with the name of a ticker replaced by the word that stands for any ticker. */
const helpPath = (path: Path): string =>
  path
    .map((key, place) =>
      place === 2 && path[1] === 'tickers' && path[0] === 'feed' ? anyTicker : String(key),
    )
    .join('.');

const childrenOf = (help: readonly SettingHelp[], parent: string): string[] => {
  const prefix = parent === '' ? '' : `${parent}.`;
  const below = help.filter(({ path }) => path.startsWith(prefix) && path !== parent);
  return [...new Set(below.map(({ path }) => path.slice(prefix.length).split('.')[0] ?? ''))];
};

const unknownKey = (help: readonly SettingHelp[], parent: Path, key: string, written: unknown): Breach => {
  const path = [...parent, key].join('.');
  const siblings = childrenOf(help, helpPath(parent));
  const nearest = nearestWord(key, siblings);
  const advice = nearest === null ? `Known here: ${siblings.join(', ')}` : `Did you mean ${nearest}?`;
  return {
    path,
    value: nameOfSecret.test(key) ? '(not shown)' : shown(valueAt(written, [...parent, key])),
    message: `There is no setting ${path}. ${advice}`,
  };
};

/** What would be right at a path, or at the nearest setting above it: an element of a list has no help of its own. */
const expectedAt = (help: readonly SettingHelp[], path: Path): string | null => {
  for (let length = path.length; length > 0; length -= 1) {
    const found = help.find((one) => one.path === helpPath(path.slice(0, length)));
    if (found !== undefined) return found.expects;
  }
  return null;
};

const wrongValue = (help: readonly SettingHelp[], path: Path, written: unknown): Breach => {
  const name = path.join('.') || 'the file';
  const found = shown(valueAt(written, path));
  const value = found !== null && nameOfSecret.test(name) ? '(not shown)' : found;
  const right = expectedAt(help, path) ?? `a block with ${childrenOf(help, helpPath(path)).join(', ')}`;
  const message =
    value === null ? `${name} is missing; it must be ${right}.` : `${name} is ${value}; it must be ${right}.`;
  return { path: path.join('.'), value, message };
};

/** The schema's findings in the words of the settings' own help: where, what stands there, what would be right. */
export const problemsOfIssues = (
  issues: readonly z.core.$ZodIssue[],
  written: unknown,
): readonly Breach[] => {
  const help = settingsHelp();
  return issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => unknownKey(help, issue.path, key, written))
      : [wrongValue(help, issue.path, written)],
  );
};
