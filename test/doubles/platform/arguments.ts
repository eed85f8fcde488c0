import type { Arguments } from './records.ts';

/** A refusal in the platform's own words: HTTP 200 with `ok: false`. */
export class Refused extends Error {
  readonly code: string;
  readonly details: readonly string[];
  constructor(code: string, details: readonly string[] = []) {
    super(code);
    this.code = code;
    this.details = details;
  }
}

const readField = (written: string): unknown => {
  if (!/^[[{]/.test(written)) return written;
  try {
    return JSON.parse(written);
  } catch {
    throw new Refused('invalid_form_data');
  }
};

/** Form fields as the platform reads them: arrays and objects are JSON inside the field. */
export const fromForm = (body: string): Arguments =>
  Object.fromEntries([...new URLSearchParams(body)].map(([name, value]) => [name, readField(value)]));

export const words = (args: Arguments, name: string): string | null => {
  const value = args[name];
  return typeof value === 'string' && value !== '' ? value : null;
};

export const needed = (args: Arguments, name: string): string => {
  const value = words(args, name);
  if (value === null) throw new Refused('invalid_arguments', [`[ERROR] missing required field: ${name}`]);
  return value;
};

export const flag = (args: Arguments, name: string): boolean =>
  args[name] === true || args[name] === 'true' || args[name] === '1';

export const count = (args: Arguments, name: string, otherwise: number): number => {
  const value = Number(args[name] ?? otherwise);
  return Number.isFinite(value) ? value : otherwise;
};

/** One page of a list; the cursor is the place to go on from, opaque to the caller. */
export const page = <T>(all: readonly T[], args: Arguments, most: number) => {
  const limit = Math.min(count(args, 'limit', 100), most);
  const cursor = words(args, 'cursor');
  const from = cursor === null ? 0 : Number(Buffer.from(cursor, 'base64').toString());
  if (!Number.isInteger(from)) throw new Refused('invalid_cursor');
  const next = from + limit;
  return {
    items: all.slice(from, next),
    hasMore: next < all.length,
    response_metadata: { next_cursor: next < all.length ? Buffer.from(String(next)).toString('base64') : '' },
  };
};
