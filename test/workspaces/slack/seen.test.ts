import { expect, it } from 'vitest';
import { askedInMemory } from '../../../src/workspaces/slack/asked.ts';
import { featureScopes, featuresOf } from '../../../src/workspaces/slack/scopes.ts';
import { seenInMemory } from '../../../src/workspaces/slack/seen.ts';
import { manualTime } from '../../doubles/time.ts';

it('a key is seen for the first time once', async () => {
  const seen = seenInMemory();
  expect([await seen.firstSeen('a'), await seen.firstSeen('b'), await seen.firstSeen('a')]).toEqual([
    true,
    true,
    false,
  ]);
});

it('memory of what was seen is bounded: the oldest of more than 20,000 keys is forgotten first', async () => {
  const seen = seenInMemory();
  for (let count = 0; count <= 20_000; count += 1) await seen.firstSeen(String(count));
  expect(await seen.firstSeen('1')).toBe(false);
  expect(await seen.firstSeen('0')).toBe(true);
});

it('a question is recalled while it can be edited, and forgotten later', async () => {
  const time = manualTime();
  const asked = askedInMemory(time);
  const question = { words: 'feed', replies: Promise.resolve([]) };
  asked.remember('a', question);
  time.advance(600_000);
  asked.remember('b', question);
  expect(await asked.recall('a', '')).toBe(question);
  time.advance(600_001);
  asked.remember('c', question);
  expect(await asked.recall('a', '')).toBeNull();
  expect(await asked.recall('b', '')).toBe(question);
});

it('every feature stays on where the platform does not say which scopes there are', () => {
  const warnings: string[] = [];
  const log = { info: () => {}, warn: (message: string) => void warnings.push(message), error: () => {} };
  expect(featuresOf(null, log).size).toBe(Object.keys(featureScopes).length);
  expect(warnings).toHaveLength(1);
});
