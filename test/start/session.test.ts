import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { exitCodes } from '../../src/start/exit.ts';
import { sitAt } from '../../src/start/session.ts';
import { problem } from '../../src/terms/problem.ts';
import { refuse } from '../../src/terms/result.ts';
import type { Terminal } from '../../src/workspaces/terminal/start.ts';

const folder = mkdtempSync(join(tmpdir(), 'session-'));
afterAll(() => rmSync(folder, { recursive: true }));

const terminalWith = (...typed: readonly string[]): Terminal => {
  const left = [...typed];
  return {
    nextLine: async () => left.shift() ?? null,
    write: () => {},
    hint: () => {},
    width: () => 40,
    savePicture: async () => refuse(problem('fileUnwritable', 'No place.')),
    interactive: false,
  };
};

/** Says every line back until there is none. */
const repeating =
  (more = '') =>
  async (terminal: Terminal): Promise<void> => {
    for (let line = await terminal.nextLine(''); line !== null; line = await terminal.nextLine(''))
      terminal.write(`${line}${more}\n`);
  };

test('a session is recorded into a new file, and replayed from it', async () => {
  const file = join(folder, 'one.txt');
  const recorded = await sitAt(terminalWith('a', 'b'), { record: file, replay: null }, repeating());
  expect(recorded).toBe(exitCodes.answered);
  expect(readFileSync(file, 'utf8')).toBe('leadsman session 1, width 40\n> a\n  a\n> b\n  b\n');
  const replay = { record: null, replay: file };
  expect(await sitAt(terminalWith(), replay, repeating())).toBe(exitCodes.answered);
  expect(await sitAt(terminalWith(), replay, repeating('!'))).toBe(exitCodes.refused);
});

test('an older session is not written over', async () => {
  const file = join(folder, 'two.txt');
  writeFileSync(file, 'mine');
  expect(await sitAt(terminalWith('a'), { record: file, replay: null }, repeating())).toBe(exitCodes.refused);
  expect(readFileSync(file, 'utf8')).toBe('mine');
});

test('what is no session, or is not there, is not replayed', async () => {
  const file = join(folder, 'three.txt');
  writeFileSync(file, 'mine');
  for (const replay of [file, join(folder, 'none.txt')])
    expect(await sitAt(terminalWith(), { record: null, replay }, repeating())).toBe(exitCodes.refused);
});
