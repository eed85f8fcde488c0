import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll } from 'vitest';

const project = new URL('../../..', import.meta.url).pathname;

/** Tests leave the records of whoever works on this machine alone. */
const folder = mkdtempSync(join(tmpdir(), 'leadsman-run-'));
export const recordsFile = join(folder, 'records.db');
afterAll(() => rmSync(folder, { recursive: true, force: true }));

export type Ran = { readonly code: number | null; readonly stdout: string; readonly stderr: string };

const ownRecords = (script: string): readonly string[] =>
  script === 'inspect' ? [] : ['--records', recordsFile];

/** Runs a built command of the project as a person would, with the given standard input. */
export const run = (
  script: 'ask' | 'serve' | 'inspect' | 'export' | 'backup',
  words: readonly string[],
  input: string | null = null,
  env: Readonly<Record<string, string>> = {},
): Promise<Ran> =>
  new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [`dist/start/${script}.js`, ...ownRecords(script), ...words], {
      cwd: project,
      env: { PATH: process.env.PATH ?? '', ...env },
      stdio: ['pipe', 'pipe', 'pipe'],
    });
    let [stdout, stderr] = ['', ''];
    child.stdout.on('data', (chunk) => {
      stdout += chunk;
    });
    child.stderr.on('data', (chunk) => {
      stderr += chunk;
    });
    child.on('error', reject);
    child.on('close', (code) => resolve({ code, stdout, stderr }));
    child.stdin.end(input ?? '');
  });
