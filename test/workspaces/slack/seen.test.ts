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

it('a feature without its scopes is off, and what is denied without it is said', () => {
  const warnings: string[] = [];
  const log = { info: () => {}, warn: (message: string) => void warnings.push(message), error: () => {} };
  const scopes = Object.values(featureScopes)
    .flat()
    .filter((scope) => scope !== 'groups:read' && scope !== 'pins:read');
  const on = featuresOf(scopes, log);
  expect([on.has('channelKind'), on.has('pin'), on.has('members')]).toEqual([false, false, true]);
  expect(warnings).toEqual([
    'The feature channelKind is off: the token lacks groups:read. Add it to the app and install it again. Until then only channels are answered that permissions.sharedChannels names.',
    'The feature pin is off: the token lacks pins:read. Add it to the app and install it again.',
  ]);
});

it('every feature stays on where the platform does not say which scopes there are', () => {
  const warnings: string[] = [];
  const log = { info: () => {}, warn: (message: string) => void warnings.push(message), error: () => {} };
  expect(featuresOf(null, log).size).toBe(Object.keys(featureScopes).length);
  expect(warnings).toHaveLength(1);
});
