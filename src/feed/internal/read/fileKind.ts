import { open } from 'node:fs/promises';
import { type Problem, problem } from '../../../terms/problem.ts';

const endings = { csv: '.csv', gz: '.csv.gz', zst: '.csv.zst', parquet: '.parquet' } as const;
export type FileKind = keyof typeof endings;

const kinds: readonly FileKind[] = ['csv', 'gz', 'zst', 'parquet'];

/** How a file is to be read, by the end of its name; null for a name that says nothing. */
export const fileKindOf = (path: string): FileKind | null =>
  kinds.find((kind) => path.toLowerCase().endsWith(endings[kind])) ?? null;

const firstBytesOf = {
  gz: [0x1f, 0x8b],
  zst: [0x28, 0xb5, 0x2f, 0xfd],
  parquet: [0x50, 0x41, 0x52, 0x31],
} as const;

const strangers: readonly (readonly [string, readonly number[]])[] = [
  ['a gzip file', firstBytesOf.gz],
  ['a Zstandard file', firstBytesOf.zst],
  ['a Parquet file', firstBytesOf.parquet],
  ['a spreadsheet or zip file', [0x50, 0x4b, 0x03, 0x04]],
  ['an old spreadsheet file', [0xd0, 0xcf, 0x11, 0xe0]],
  ['text in UTF-16', [0xff, 0xfe]],
  ['text in UTF-16', [0xfe, 0xff]],
];

const beginsWith = (head: Uint8Array, bytes: readonly number[]): boolean =>
  bytes.every((byte, place) => head[place] === byte);

const wrongKind = (path: string, kind: FileKind, head: Uint8Array): Problem | null => {
  if (kind !== 'csv') {
    return beginsWith(head, firstBytesOf[kind])
      ? null
      : problem(
          'fileUnreadable',
          `${path} is not what its name says: it does not begin as a ${endings[kind]} file does. Write it again.`,
        );
  }
  const stranger = strangers.find(([, bytes]) => beginsWith(head, bytes));
  return stranger === undefined
    ? null
    : problem(
        'fileUnreadable',
        `${path} is ${stranger[0]}, not text in UTF-8. Save it as CSV in UTF-8, or give it the name of what it is.`,
      );
};

/** Why the first bytes contradict the file's name; null where they agree. An empty file contradicts every name but .csv. */
export const contradictsItsName = async (path: string, kind: FileKind): Promise<Problem | null> => {
  const file = await open(path);
  try {
    const { buffer, bytesRead } = await file.read(new Uint8Array(4), 0, 4, 0);
    return wrongKind(path, kind, buffer.subarray(0, bytesRead));
  } finally {
    await file.close();
  }
};
