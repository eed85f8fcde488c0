import { again } from './again.ts';
import { backtest } from './backtest.ts';
import { claim } from './claim.ts';
import { compare } from './compare.ts';
import { digest } from './digest.ts';
import { feed } from './feed.ts';
import { help } from './help.ts';
import { interval } from './interval.ts';
import { need } from './need.ts';
import { pin, unpin } from './pin.ts';
import { records } from './records.ts';
import { shape } from './shape.ts';
import { tail } from './tail.ts';
import type { VerbReader } from './verbReader.ts';
import { watch } from './watch.ts';

/** The verbs that can be read whole. */
const readers: readonly VerbReader[] = [
  interval,
  tail,
  shape,
  claim,
  need,
  compare,
  backtest,
  digest,
  watch,
  pin,
  unpin,
  again,
  records,
  feed,
  help,
];

const byVerb: ReadonlyMap<string, VerbReader> = new Map(readers.map((reader) => [reader.verb, reader]));

export const readerOf = (verb: string): VerbReader | null => byVerb.get(verb) ?? null;

export const readableVerbs: readonly string[] = readers.map(({ verb }) => verb);
