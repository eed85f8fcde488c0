import { createReadStream } from 'node:fs';
import { open } from 'node:fs/promises';
import { createGunzip } from 'node:zlib';

export const pieceBytes = 262_144;

/** A file piece by piece. A piece is good until the next is asked for: one buffer serves all, which a stream does not do. */
export async function* textPieces(path: string): AsyncGenerator<Uint8Array> {
  const file = await open(path);
  const buffer = new Uint8Array(pieceBytes);
  try {
    for (;;) {
      const { bytesRead } = await file.read(buffer, 0, pieceBytes, null);
      if (bytesRead === 0) return;
      yield buffer.subarray(0, bytesRead);
    }
  } finally {
    await file.close();
  }
}

/** What a gzip file holds, piece by piece; throws where it is damaged, by the check sum at the end of each member. */
export const gunzippedPieces = (path: string): AsyncIterable<Uint8Array> =>
  createReadStream(path).pipe(createGunzip({ chunkSize: pieceBytes }));
