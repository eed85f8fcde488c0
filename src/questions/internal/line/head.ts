import { type Attempt, attained, faulty } from '../faults/fault.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { leadingPlace } from '../recognisers/table.ts';
import { readerOf } from '../verbs/table.ts';
import type { VerbReader } from '../verbs/verbReader.ts';
import { stoodFor, takesAnotherVerb, verbOfWord } from '../verbs/verbWords.ts';
import { notBuilt, noVerb, severalVerbs } from './headFaults.ts';
import { type VerbPlace, verbPlaces } from './verbPlaces.ts';

/** The verb of a line, the places of its words, and what was taken for granted in finding it. */
export type Head = {
  readonly reader: VerbReader;
  readonly verbAt: ReadonlySet<number>;
  readonly assumed: readonly string[];
};

/** The first word that is no filler. */
const leadingWord = (line: Line): string | null => {
  const word = line.words[leadingPlace(line)];
  return word === undefined || word.quoted ? null : word.lower;
};

const headWithoutVerb = (line: Line): Attempt<Head> => {
  const reader = readerOf('interval');
  if (leadingWord(line) !== 'vol' || reader === null) return faulty(noVerb(line));
  return attained({ reader, verbAt: new Set(), assumed: ['vol read as interval vol'] });
};

const standIns = (line: Line, places: readonly VerbPlace[]): readonly string[] => {
  const notes = places.map(({ at }) => stoodFor(line.words[at]?.lower ?? ''));
  return notes.includes(null) ? [] : notes.flatMap((note) => note ?? []).slice(0, 1);
};

const readHead = (line: Line): Attempt<Head> => {
  const all = verbPlaces(line);
  const [first] = all;
  if (first === undefined) return headWithoutVerb(line);
  const places = takesAnotherVerb(first.verb) ? [first] : all;
  if (places.some(({ verb }) => verb !== first.verb)) return faulty(severalVerbs(line, places));
  const reader = readerOf(first.verb);
  return reader === null
    ? faulty(notBuilt(line, all))
    : attained({ reader, verbAt: new Set(places.map(({ at }) => at)), assumed: standIns(line, places) });
};

/** The one verb of the line, if it can be answered now. */
export const findHead = (line: Line): Attempt<Head> => {
  const head = readHead(line);
  if (!head.ok || line.context.builtVerbs.includes(head.value.reader.verb)) return head;
  return faulty(notBuilt(line, verbPlaces(line)));
};

/** Whether the words begin a question of their own when they stand on a line of their own. */
export const beginsQuestion = (line: Line): boolean => {
  const leading = leadingWord(line);
  return leading !== null && (leading === 'vol' || verbOfWord(leading) !== null);
};
