import { type FileHandle, open } from 'node:fs/promises';
import type { FileKind } from './fileKind.ts';
import { gunzippedPieces, textPieces } from './pieces.ts';

/**
 * Whether a file reaches its own end and has rows of a sane length. The reader accepts a compressed file that was cut
 * off and serves the rows before the cut, and it drops a last row that is longer than its buffer, so both are found
 * out here. `unfinishedLine`: text that does not end with a line end, which is either a habit of the program that
 * wrote it or a cut through the last row.
 */
export type Wholeness = 'whole' | 'cutOff' | 'lineTooLong' | 'unfinishedLine';

export const mostLineBytes = 1_000_000;

const [lineFeed, carriageReturn] = [0x0a, 0x0d];

const isLineEnd = (byte: number | undefined): boolean => byte === lineFeed || byte === carriageReturn;

/** Where the first line of a piece ends that has a line end. */
const firstLineEnd = (piece: Uint8Array): number => {
  let at = 0;
  while (!isLineEnd(piece[at])) at += 1;
  return at;
};

/** −1 where there is none. */
const lastLineEnd = (piece: Uint8Array): number => {
  let at = piece.length - 1;
  while (at >= 0 && !isLineEnd(piece[at])) at -= 1;
  return at;
};

/** Looks at text piece by piece. Pieces are far shorter than the longest row, so that only a row over several counts. */
const makeTextWatch = () => {
  let sinceLineEnd = 0;
  let isTooLong = false;
  let last: number | undefined;
  return {
    see: (piece: Uint8Array): void => {
      const lastEnd = lastLineEnd(piece);
      const first = lastEnd < 0 ? piece.length : firstLineEnd(piece);
      isTooLong ||= sinceLineEnd + first > mostLineBytes;
      sinceLineEnd = lastEnd < 0 ? sinceLineEnd + piece.length : piece.length - 1 - lastEnd;
      last = piece.at(-1) ?? last;
    },
    verdict: (): Wholeness => {
      if (isTooLong) return 'lineTooLong';
      return last === undefined || isLineEnd(last) ? 'whole' : 'unfinishedLine';
    },
  };
};

const wholenessOfText = async (pieces: AsyncIterable<Uint8Array>): Promise<Wholeness> => {
  const watch = makeTextWatch();
  for await (const piece of pieces) watch.see(piece);
  return watch.verdict();
};

const wholenessOfGzip = async (path: string): Promise<Wholeness> => {
  try {
    return await wholenessOfText(gunzippedPieces(path));
  } catch {
    return 'cutOff';
  }
};

type Bytes = (position: number, count: number) => Promise<DataView | null>;

const zstandardMagic = 0xfd2fb528;

/** Bytes of a Zstandard frame header after its magic number, from its first byte (RFC 8878, section 3.1.1.1). */
const frameHeaderBytes = (descriptor: number): number => {
  const sizeFlag = descriptor >>> 6;
  const singleSegment = (descriptor >>> 5) & 1;
  const dictionaryBytes = [0, 1, 2, 4][descriptor & 3] ?? 0;
  const contentBytes = sizeFlag === 0 ? singleSegment : 2 ** sizeFlag;
  return 1 + (1 - singleSegment) + dictionaryBytes + contentBytes;
};

/** Where the frame that starts at `start` ends, or null where the file ends before it (RFC 8878, section 3.1). */
const endOfFrame = async (bytes: Bytes, start: number): Promise<number | null> => {
  const head = await bytes(start, 8);
  if (head === null) return null;
  const magic = head.getUint32(0, true);
  if (magic >>> 4 === 0x0184d2a5) return start + 8 + head.getUint32(4, true);
  if (magic !== zstandardMagic) return null;
  const descriptor = head.getUint8(4);
  let position = start + 4 + frameHeaderBytes(descriptor);
  for (;;) {
    const block = await bytes(position, 3);
    if (block === null) return null;
    const header = block.getUint8(0) | (block.getUint8(1) << 8) | (block.getUint8(2) << 16);
    const runLength = ((header >>> 1) & 3) === 1;
    position += 3 + (runLength ? 1 : header >>> 3);
    if ((header & 1) === 1) return position + ((descriptor >>> 2) & 1) * 4;
  }
};

const wholenessOfZstandard = async (file: FileHandle, size: number): Promise<Wholeness> => {
  const bytes: Bytes = async (position, count) => {
    if (position + count > size) return null;
    const { buffer } = await file.read(new Uint8Array(count), 0, count, position);
    return new DataView(buffer.buffer);
  };
  let position = 0;
  while (position < size) {
    const end = await endOfFrame(bytes, position);
    if (end === null || end > size) return 'cutOff';
    position = end;
  }
  return 'whole';
};

/** Parquet has its directory at its end, so that the reader itself refuses one that was cut off. */
export const wholenessOf = async (path: string, kind: FileKind): Promise<Wholeness> => {
  if (kind === 'parquet') return 'whole';
  if (kind === 'csv') return wholenessOfText(textPieces(path));
  if (kind === 'gz') return wholenessOfGzip(path);
  const file = await open(path);
  try {
    const { size } = await file.stat();
    return await wholenessOfZstandard(file, size);
  } finally {
    await file.close();
  }
};
