import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { confinableVerbs } from '../../src/config/permissionsSchema.ts';
import { parseSettings } from '../../src/config/read.ts';
import { languageVerbs } from '../../src/questions/internal/verbs/verbWords.ts';

const read = (permissions: string) =>
  parseSettings(`feed: { path: prices.csv }\npermissions: ${permissions}\n`, '/desk');

const problemsOf = (permissions: string) => {
  const reading = read(permissions);
  return reading.ok ? [] : reading.problems.map(({ path, message }) => `${path} | ${message}`);
};

describe('permissions in the settings', () => {
  test('can be left out, and then deny nothing', () => {
    const reading = read('{}');
    expect(reading.ok && reading.settings.permissions).toEqual({
      workspaces: [],
      channels: [],
      people: [],
      verbs: {},
      sharedChannels: [],
      digestManagers: [],
      questionsPerMinute: 30,
    });
  });

  test('are read whole', () => {
    const written =
      '{ workspaces: [T1DESK], channels: [C1RISK, C1FUND, direct], people: [U1ADA], verbs: { book: [C1RISK, direct] }, sharedChannels: [C1FUND], digestManagers: [U1BEN], questionsPerMinute: null }';
    expect(problemsOf(written)).toEqual([]);
  });

  test.each([
    [
      '{ channels: ["#risk"] }',
      'permissions.channels.0 | permissions.channels.0 is “#risk”; it must be a list of channel ids such as',
    ],
    [
      '{ people: [ada] }',
      'permissions.people.0 | permissions.people.0 is “ada”; it must be a list of person ids',
    ],
    [
      '{ people: U1ADA }',
      'permissions.people | permissions.people is “U1ADA”; it must be a list of person ids',
    ],
    ['{ workspaces: [D1] }', 'it must be a list of workspace ids'],
    ['{ verbs: { book: [risk] } }', 'permissions.verbs.book.0 is “risk”; it must be verbs, each with a list'],
    ['{ sharedChannels: [direct] }', 'it must be a list of channel ids such as [C024FUND]'],
    ['{ questionsPerMinute: 0 }', 'from 1 to 600'],
    [
      '{ verbs: { recods: [C1RISK] } }',
      'permissions.verbs.recods | permissions.verbs.recods is C1RISK: it is no verb; records comes nearest.',
    ],
    ['{ verbs: { entirely: [] } }', 'it is no verb; the verbs are interval, tail'],
    [
      '{ channels: [C1RISK], sharedChannels: [C1FUND] }',
      'permissions.sharedChannels is C1FUND: that channel is not among permissions.channels',
    ],
    [
      '{ channels: [C1RISK], verbs: { book: [direct] } }',
      'permissions.verbs.book is direct: direct messages are not among permissions.channels',
    ],
    ['{ chanels: [C1RISK] }', 'There is no setting permissions.chanels. Did you mean channels?'],
  ])('%s is refused by name', (written, says) => {
    const problems = problemsOf(written);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toContain(says);
  });

  test('stand in the README as they can be written', () => {
    const readme = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');
    const written = /```yaml\n(permissions:[\s\S]*?)```/.exec(readme)?.[1] ?? 'missing: true';
    const reading = parseSettings(`feed: { path: prices.csv }\n${written}`, '/desk');
    expect(reading.ok && reading.settings.permissions.verbs).toEqual({ book: ['C024RISK'] });
  });

  test('know every verb of the language', () => {
    expect(confinableVerbs).toEqual(languageVerbs);
  });
});
