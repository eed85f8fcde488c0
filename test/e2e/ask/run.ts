import { spawn } from 'node:child_process';

const project = new URL('../../..', import.meta.url).pathname;

export type Ran = { readonly code: number | null; readonly stdout: string; readonly stderr: string };

/** Runs a built command of the project as a person would, with the given standard input. */
export const run = (
  script: 'ask' | 'serve' | 'inspect',
  words: readonly string[],
  input: string | null = null,
  env: Readonly<Record<string, string>> = {},
): Promise<Ran> =>
  new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [`dist/start/${script}.js`, ...words], {
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
