import { readFileSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import { LineCounter, parseDocument } from 'yaml';
import type { z } from 'zod';
import { type Problem, problem } from '../terms/problem.ts';
import { problemsOfIssues } from './internal/issues.ts';
import { rules } from './rules.ts';
import { type Settings, settingsSchema } from './schema.ts';

/** One thing wrong with the settings: where, what stands there (null: nothing), and in `message` what would be right. */
export type SettingProblem = Problem & { readonly path: string; readonly value: string | null };

export type SettingsReading =
  | { readonly ok: true; readonly settings: Settings }
  | { readonly ok: false; readonly problems: readonly SettingProblem[] };

const settingProblem = (path: string, value: string | null, message: string): SettingProblem => ({
  ...problem('settingWrong', message),
  path,
  value,
});

const readYaml = (text: string): { value: unknown } | { problems: readonly SettingProblem[] } => {
  const lineCounter = new LineCounter();
  const document = parseDocument(text, { lineCounter, prettyErrors: false });
  if (document.errors.length === 0) return { value: document.toJS() };
  const problems = document.errors.map((error) => {
    const { line, col } = lineCounter.linePos(error.pos[0]);
    return settingProblem(
      '',
      null,
      `Line ${line}, column ${col} is not YAML: ${error.message}. Correct that line.`,
    );
  });
  return { problems };
};

const checkRules = (settings: Settings): readonly SettingProblem[] =>
  rules.flatMap((rule) =>
    rule(settings).map(({ path, value, message }) =>
      settingProblem(path, value, `${path} is ${value}: ${message}.`),
    ),
  );

const withAbsolutePaths = (settings: Settings, folder: string): Settings => {
  const { feed } = settings;
  const holidaysPath = feed.holidays.path === null ? null : resolve(folder, feed.holidays.path);
  const holidays = { ...feed.holidays, path: holidaysPath };
  return { ...settings, feed: { ...feed, path: resolve(folder, feed.path), holidays } };
};

/** Settings from the text of a settings file, or everything that is wrong with it. Relative paths start at `folder`. */
export const parseSettings = (text: string, folder: string): SettingsReading => {
  const yaml = readYaml(text);
  if ('problems' in yaml) return { ok: false, problems: yaml.problems };
  const written: unknown = yaml.value ?? {};
  const parsed: z.ZodSafeParseResult<Settings> = settingsSchema.safeParse(written);
  if (!parsed.success) {
    const problems = problemsOfIssues(parsed.error.issues, written);
    return { ok: false, problems: problems.map((one) => settingProblem(one.path, one.value, one.message)) };
  }
  const problems = checkRules(parsed.data);
  if (problems.length > 0) return { ok: false, problems };
  return { ok: true, settings: withAbsolutePaths(parsed.data, folder) };
};

/** Settings from a file, or everything that is wrong with it. */
export const readSettings = (path: string): SettingsReading => {
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch (error) {
    const reason = error instanceof Error && 'code' in error ? String(error.code) : 'unknown reason';
    const message = `The settings file ${path} cannot be read (${reason}). Name a file that exists and may be read.`;
    return { ok: false, problems: [{ ...settingProblem('', null, message), code: 'fileUnreadable' }] };
  }
  return parseSettings(text, dirname(resolve(path)));
};
