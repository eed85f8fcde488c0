import { deflateSync, inflateSync } from 'node:zlib';
import type { PriceSeries } from '../../terms/prices.ts';
import { pricesDigest } from './digest.ts';

const bytesPerDay = Int32Array.BYTES_PER_ELEMENT;
const bytesPerPrice = bytesPerDay + Float64Array.BYTES_PER_ELEMENT;

type Columns = Pick<PriceSeries, 'days' | 'closes'>;

/** Days as int32, then closes as float64, in the machine’s little-endian order. */
const bytesOf = ({ days, closes }: Columns): Uint8Array =>
  Buffer.concat([
    new Uint8Array(days.buffer, days.byteOffset, days.byteLength),
    new Uint8Array(closes.buffer, closes.byteOffset, closes.byteLength),
  ]);

export const packPrices = (series: PriceSeries) => {
  const bytes = bytesOf(series);
  return {
    digest: pricesDigest(series.ticker, bytes),
    ticker: series.ticker,
    price_count: series.days.length,
    packed: new Uint8Array(deflateSync(bytes)),
  };
};

/** The columns and the digest of what was really unpacked. Throws on bytes that were not packed here. */
export const unpackPrices = (ticker: string, packed: Uint8Array): Columns & { readonly digest: string } => {
  const bytes = inflateSync(packed);
  const count = bytes.byteLength / bytesPerPrice;
  if (!Number.isInteger(count))
    throw new RangeError(`unpackPrices: ${bytes.byteLength} bytes are no whole number of prices`);
  const daysEnd = count * bytesPerDay;
  // sliced, so that each column starts where its type may start
  const own = new Uint8Array(bytes);
  return {
    days: new Int32Array(own.slice(0, daysEnd).buffer),
    closes: new Float64Array(own.slice(daysEnd).buffer),
    digest: pricesDigest(ticker, bytes),
  };
};
