import { createHash } from 'node:crypto';
import { methodVersion } from './answer.ts';

/** The prices an answer rests on, as they are fingerprinted. */
export type UsedPrices = {
  readonly ticker: string;
  readonly days: Int32Array;
  readonly closes: Float64Array;
};

export type Identity = {
  readonly id: string;
  readonly seed: string;
  readonly seedBytes: Uint8Array;
  readonly dataFingerprint: string;
};

const bytesOf = (column: Int32Array | Float64Array): Uint8Array =>
  new Uint8Array(column.buffer, column.byteOffset, column.byteLength);

/** Hex SHA-256 over ticker, days (little-endian int32) and closes (little-endian float64) of each series in turn. */
export const fingerprintOf = (used: readonly UsedPrices[]): string => {
  const hash = createHash('sha256');
  for (const { ticker, days, closes } of used)
    hash.update(`${ticker}\n${days.length}\n`).update(bytesOf(days)).update(bytesOf(closes));
  return hash.digest('hex');
};

/** Crockford's base32 alphabet (2019): no I, L, O or U. */
const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const idLength = 10;

const crockford = (bytes: Uint8Array, length: number): string => {
  let bits = 0n;
  for (const byte of bytes) bits = (bits << 8n) | BigInt(byte);
  const total = BigInt(bytes.length * 8);
  return Array.from({ length }, (_, place) => {
    const shift = total - 5n * BigInt(place + 1);
    return alphabet[Number((bits >> shift) & 31n)] ?? '';
  }).join('');
};

/** The id of an answer from the digest of what makes it; more characters than usual where two would share the usual. */
export const recordIdOf = (digest: Uint8Array, length: number = idLength): string =>
  `R-${crockford(digest, length)}`;

/**
 * Who an answer is: its seed follows from the canonical question and the data, its id from these, the method version and
 * the seed. The same question on the same data therefore has the same id and the same random draws.
 */
export const identify = (canonicalQuestion: string, used: readonly UsedPrices[]): Identity => {
  const dataFingerprint = fingerprintOf(used);
  const seedBytes = createHash('sha256').update(`${canonicalQuestion}\n${dataFingerprint}`).digest();
  const seed = seedBytes.toString('hex');
  const content = createHash('sha256')
    .update([canonicalQuestion, dataFingerprint, methodVersion, seed].join('\n'))
    .digest();
  return {
    id: recordIdOf(content),
    seed,
    seedBytes: new Uint8Array(seedBytes),
    dataFingerprint,
  };
};
