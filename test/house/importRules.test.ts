import { execFileSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

const project = new URL('../..', import.meta.url).pathname;

/** Each planted file breaks exactly one rule; a checker that reads nothing would miss them all. */
const planted: readonly (readonly [string, string, string])[] = [
  ['src/terms/upward.ts', "import '../stats/core.ts';", 'terms-keeps-to-its-level'],
  ['src/stats/sideways.ts', "import '../feed/file.ts';", 'stats-keeps-to-its-level'],
  [
    'src/present/runs.ts',
    "import { core } from '../answers/core.ts';\nconsole.log(core);",
    'present-takes-types-only',
  ],
  [
    'src/stats/reads.ts',
    "import { readFileSync } from 'node:fs';\nreadFileSync('x');",
    'pure-rooms-touch-nothing-outside',
  ],
  [
    'src/feed/chats.ts',
    "import bolt from '@slack/bolt';\nconsole.log(bolt);",
    'chat-library-only-in-workspaces/slack',
  ],
  [
    'src/answers/counts.ts',
    "import jStat from 'jstat';\nconsole.log(jStat);",
    'distribution-library-only-in-stats',
  ],
  [
    'src/digests/charts.ts',
    "import { compile } from 'vega-lite';\nconsole.log(compile);",
    'chart-grammar-only-in-present/picture',
  ],
  [
    'src/present/picture/paints.ts',
    "import { Resvg } from '@resvg/resvg-js';\nconsole.log(Resvg);",
    'rasteriser-only-in-start',
  ],
  [
    'src/start/pictures/early.ts',
    "import { toPng } from './png.ts';\nconsole.log(toPng);",
    'drawing-is-loaded-late',
  ],
  [
    'src/start/early.ts',
    "import draw from './pictures/worker.ts';\nconsole.log(draw);",
    'the-drawing-thread-is-imported-late',
  ],
  ['src/workspaces/starts.ts', "import '../start/core.ts';", 'nobody-imports-start'],
  ['src/questions/first.ts', "import './second.ts';", 'no-cycles'],
  ['src/config/lost.ts', "import './nowhere.ts';", 'no-unresolvable'],
];

const companions: readonly (readonly [string, string])[] = [
  ['src/stats/core.ts', 'export const core = 1;'],
  ['src/answers/core.ts', 'export const core = 1;'],
  ['src/feed/file.ts', 'export const file = 1;'],
  ['src/start/core.ts', 'export const core = 1;'],
  ['src/questions/second.ts', "import './first.ts';"],
  ['src/start/pictures/png.ts', 'export const toPng = 1;'],
  ['src/start/pictures/worker.ts', 'export default 1;'],
];

describe('the import rules', () => {
  let folder = '';
  let report = '';

  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'import-rules-'));
    for (const name of ['.dependency-cruiser.cjs', 'tsconfig.json', 'package.json'])
      cpSync(join(project, name), join(folder, name));
    symlinkSync(join(project, 'node_modules'), join(folder, 'node_modules'));
    for (const [path, text] of [...companions, ...planted.map(([path, text]) => [path, text] as const)]) {
      mkdirSync(dirname(join(folder, path)), { recursive: true });
      writeFileSync(join(folder, path), `${text}\n`);
    }
    try {
      const tool = join(project, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
      report = execFileSync(process.execPath, [tool, '--config', '.dependency-cruiser.cjs', 'src'], {
        cwd: folder,
        encoding: 'utf8',
      });
    } catch (error) {
      report = String((error as { stdout?: unknown }).stdout);
    }
  });

  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  test.each(planted)('%s is caught', (path, _text, rule) => {
    const caught = report.split('\n').some((line) => line.includes(rule) && line.includes(path));
    expect(caught, report).toBe(true);
  });
});
