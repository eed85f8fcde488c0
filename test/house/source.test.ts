import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { describe, expect, test } from 'vitest';

const project = new URL('../..', import.meta.url).pathname;

const filesBelow = (folder: string): string[] =>
  readdirSync(join(project, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(ts|mjs|cjs)$/.test(entry.name))
    .map((entry) => relative(project, join(entry.parentPath, entry.name)))
    .sort();

const textOf = (path: string): string => readFileSync(join(project, path), 'utf8');

/** Code without its comments, so that prose may name what code may not use. */
const codeOf = (path: string): string =>
  textOf(path)
    .replace(/\/\*[\s\S]*?\*\//g, '')
    .replace(/(^|\s)\/\/.*$/gm, '$1');

const source = filesBelow('src');
const outside = (...rooms: string[]) =>
  source.filter((path) => !rooms.some((room) => path.startsWith(`src/${room}/`)));

const offenders = (paths: readonly string[], pattern: RegExp): string[] =>
  paths.filter((path) => pattern.test(codeOf(path)));

describe('the source keeps the habits of the house', () => {
  test('the machine’s clock is read in start only', () => {
    expect(offenders(outside('start'), /\bDate\.now\b|\bnew Date\(\)|\bperformance\.now\b/)).toEqual([]);
  });

  test('the global random source is read nowhere', () => {
    expect(offenders(source, /\bMath\.random\b/)).toEqual([]);
  });

  test('the process and its environment are touched in start and config only', () => {
    expect(offenders(outside('start', 'config'), /\bprocess\.(?!ts\b)/)).toEqual([]);
  });

  test('no type is switched off', () => {
    expect(offenders(source, /\bas any\b|:\s*any\b|@ts-(ignore|expect-error|nocheck)/)).toEqual([]);
  });

  test('no file is longer than 400 lines and nine in ten are under 200', () => {
    const lengths = source.map((path) => ({ path, lines: textOf(path).split('\n').length }));
    expect(lengths.filter(({ lines }) => lines > 400)).toEqual([]);
    expect(lengths.filter(({ lines }) => lines > 200).length).toBeLessThanOrEqual(source.length / 10);
  });

  test('no folder is a drawer for anything', () => {
    expect(source.filter((path) => /\/(utils?|helpers?|common|misc)(\/|\.ts$)/.test(path))).toEqual([]);
  });
});

describe('the tests', () => {
  test('none is skipped, singled out or left to do', () => {
    const tests = filesBelow('test').filter((path) => path !== 'test/house/source.test.ts');
    expect(offenders(tests, /\b(test|it|describe)\.(skip|only|todo)\b/)).toEqual([]);
  });
});
