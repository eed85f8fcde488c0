/** Every example in README.md and DEVELOPERS.md is run, and every path named in them is there. */
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, test } from 'vitest';
import type { Converse } from '../../src/workspaces/converse.ts';
import { type Line, readLine } from '../../src/workspaces/terminal/room.ts';
import { run } from './ask/run.ts';
import { demoConverse } from './demoDesk.ts';

const project = new URL('../..', import.meta.url).pathname;
const readme = readFileSync(join(project, 'README.md'), 'utf8');
const developers = readFileSync(join(project, 'DEVELOPERS.md'), 'utf8');
const scripts: Readonly<Record<string, string>> = JSON.parse(
  readFileSync(join(project, 'package.json'), 'utf8'),
).scripts;

/** The fenced blocks of a document with their language. */
const fences = (text: string): readonly { language: string; lines: string[] }[] => {
  const found: { language: string; lines: string[] }[] = [];
  let open: { language: string; lines: string[] } | null = null;
  for (const line of text.split('\n')) {
    const fence = /^```(\w*)$/.exec(line);
    if (fence === null) open?.lines.push(line);
    else if (open === null) open = { language: fence[1] ?? '', lines: [] };
    else {
      found.push(open);
      open = null;
    }
  }
  return found;
};

const linesIn = (text: string, wanted: string): readonly string[] =>
  fences(text).flatMap(({ language, lines }) => (language === wanted ? lines : []));

/** What is typed at the bot: plain blocks line by line, and the last column of the table of verbs. */
const typed = [
  ...linesIn(readme, ''),
  ...[...readme.matchAll(/^\| `\w+` \|.*\| `([^`]+)` \|$/gm)].map((found) => found[1] ?? ''),
];
const commands = linesIn(readme, 'sh');

const isMessage = (line: Line): line is Line & { kind: 'message' } => line.kind === 'message';

describe('what the README tells people to type', () => {
  let converse: Converse;
  beforeAll(async () => {
    converse = await demoConverse();
  });

  const questions = [...new Set(typed)]
    .map(readLine)
    .filter(isMessage)
    .map(({ text }) => text);

  test('there are examples of every verb that it names', () => {
    expect(questions.length).toBeGreaterThan(15);
    const verbs = [...readme.matchAll(/^\| `(\w+)` \|/gm)].map((found) => found[1] ?? '');
    expect(verbs.filter((verb) => !questions.some((question) => question.includes(verb)))).toEqual([]);
  });

  test.each(questions)('%s is answered', async (question) => {
    const spoken = await converse.ask({ text: question, place: 'terminal' });
    expect(spoken.length).toBeGreaterThan(0);
    expect(spoken.map(({ reply }) => reply.kind)).not.toContain('refusal');
  });
});

describe('what the README tells people to run', () => {
  const asks = commands.filter((command) => command.startsWith('npm run --silent ask -- '));

  test('there are some', () => expect(asks.length).toBeGreaterThan(2));

  test.each(asks)('%s', async (command) => {
    const words = command.slice('npm run --silent ask -- '.length).match(/"[^"]*"|\S+/g) ?? [];
    const { code, stderr } = await run(
      'ask',
      words.map((word) => word.replace(/^"|"$/g, '')),
    );
    expect({ code, stderr }).toEqual({ code: 0, stderr: '' });
  });

  const inspections = commands.filter((command) => command.startsWith('npm run --silent inspect -- '));

  test.each(inspections)('%s', async (command) => {
    const words = command.slice('npm run --silent inspect -- '.length).split(' ');
    expect((await run('inspect', words)).code).toBe(0);
  });

  test('every npm script that the documents name is there', () => {
    const named = [...`${readme}${developers}`.matchAll(/npm run (?:--silent )?([\w:-]+)/g)].map(
      (found) => found[1] ?? '',
    );
    expect(named.length).toBeGreaterThan(3);
    expect(named.filter((name) => scripts[name] === undefined)).toEqual([]);
  });
});

test('every path that the documents name is there', () => {
  const named = [
    ...`${readme}${developers}`.matchAll(
      /`((?:src|test|config|stats|answers|present|questions|terms|workspaces)\/[\w./-]+)`/g,
    ),
  ].map((found) => found[1] ?? '');
  const own = new Set(['config/settings.yaml']);
  const missing = named.filter((path) => {
    if (own.has(path) || path.includes('<')) return false;
    return ![path, `${path}.ts`, `src/${path}`, `src/${path}.ts`].some((each) =>
      existsSync(join(project, each)),
    );
  });
  expect(named.length).toBeGreaterThan(8);
  expect(missing).toEqual([]);
});
