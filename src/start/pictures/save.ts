import { mkdir, writeFile } from 'node:fs/promises';
import { dirname, join, relative, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { Picture } from '../../workspaces/pictures.ts';

/** Beside the records, which are not under version control either. */
const folder = fileURLToPath(new URL('../../../.leadsman/pictures/', import.meta.url));

/** The path as a person would type it from where the program runs. */
const asTyped = (path: string): string => {
  const short = relative(process.cwd(), path);
  return short.startsWith('..') ? path : short;
};

/** Writes a picture, to its own name among the pictures unless told where; the path. */
export const savePicture = async (
  { png, fileName }: Pick<Picture, 'png' | 'fileName'>,
  wanted: string | null = null,
): Promise<Result<string>> => {
  const path = wanted === null ? join(folder, fileName) : resolve(wanted);
  try {
    await mkdir(dirname(path), { recursive: true });
    await writeFile(path, png);
    return succeed(asTyped(path));
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return refuse(problem('fileUnwritable', `The picture cannot be written to ${asTyped(path)}: ${why}.`));
  }
};
