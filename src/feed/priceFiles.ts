import { readdir, stat } from 'node:fs/promises';
import { join, parse, sep } from 'node:path';
import { fileKindOf } from './internal/read/fileKind.ts';

/** Enough to notice that a file is no longer the one it was. */
export type FileState = {
  readonly path: string;
  readonly bytes: number;
  readonly modifiedNs: bigint;
  readonly inode: bigint;
};

const hasWildcard = (segment: string): boolean => /[*?]/.test(segment);

const matcher = (segment: string): RegExp => {
  const literal = segment.replace(/[.+^${}()|[\]\\]/g, String.raw`\$&`);
  return new RegExp(`^${literal.replaceAll('*', '.*').replaceAll('?', '.')}$`);
};

const entriesOf = async (folder: string): Promise<string[]> => {
  try {
    return (await readdir(folder)).filter((name) => !name.startsWith('.'));
  } catch {
    // a folder that is not there has no entries; that no file was found is told by the caller
    return [];
  }
};

const expand = async (folder: string, segments: readonly string[]): Promise<string[]> => {
  const [segment, ...rest] = segments;
  if (segment === undefined) return [folder];
  const names = hasWildcard(segment)
    ? (await entriesOf(folder)).filter((name) => matcher(segment).test(name))
    : [segment];
  return (await Promise.all(names.map((name) => expand(join(folder, name), rest)))).flat();
};

/** `null` for what is not there or may not be looked at. */
const stateOf = async (path: string): Promise<(FileState & { readonly isFolder: boolean }) | null> => {
  try {
    const { size, mtimeNs, ino, ...kind } = await stat(path, { bigint: true });
    return {
      path,
      bytes: Number(size),
      modifiedNs: mtimeNs,
      inode: ino,
      isFolder: (kind.mode & 0o170000n) === 0o040000n,
    };
  } catch {
    return null;
  }
};

/** The state of one file; null where there is none. */
export const stateOfFile = async (path: string): Promise<FileState | null> => {
  const state = await stateOf(path);
  return state === null || state.isFolder ? null : state;
};

const filesAt = async (path: string): Promise<FileState[]> => {
  const state = await stateOf(path);
  if (state === null) return [];
  if (!state.isFolder) return [state];
  const names = (await entriesOf(path)).filter((name) => fileKindOf(name) !== null);
  const states = await Promise.all(names.map((name) => stateOf(join(path, name))));
  return states.flatMap((found) => (found === null || found.isFolder ? [] : [found]));
};

/** The files behind a path: the file itself, the price files of a folder, or those that a pattern with * or ? fits. In the order of their names. */
export const listPriceFiles = async (path: string): Promise<readonly FileState[]> => {
  const exact = await filesAt(path);
  if (exact.length > 0 || !hasWildcard(path)) return exact.sort(byPath);
  const { root } = parse(path);
  const paths = await expand(
    root === '' ? '.' : root,
    path
      .slice(root.length)
      .split(sep)
      .filter((part) => part !== ''),
  );
  const files = (await Promise.all(paths.map(filesAt))).flat();
  return files.sort(byPath);
};

const byPath = (first: FileState, second: FileState): number => (first.path < second.path ? -1 : 1);

/** One text that differs whenever any of the files was written, replaced, added or taken away. */
export const signatureOf = (files: readonly FileState[]): string =>
  files.map(({ path, bytes, modifiedNs, inode }) => `${path}|${bytes}|${modifiedNs}|${inode}`).join('\n');
