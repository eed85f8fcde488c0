import { closestWords } from '../../closestWords.ts';
import { notAsked } from '../../help/topics.ts';
import { type Edit, type Fault, instead, type Repair } from '../faults/fault.ts';
import { faultAt, type Line } from '../recognisers/recogniser.ts';
import { fillerLength, recogniseAt } from '../recognisers/table.ts';
import { cannotBeAskedYet } from '../verbs/notBuilt.ts';
import { readableVerbs } from '../verbs/table.ts';
import { verbWords } from '../verbs/verbWords.ts';
import { notAskedFault } from './notAskedFault.ts';
import { quotedTickers } from './quotedTickers.ts';
import type { VerbPlace } from './verbPlaces.ts';

const mostWordsTried = 8;

/** Words that may be a slip of the hand for a verb. */
const misspeltVerbs = (line: Line): readonly Repair[] =>
  line.words
    .slice(0, mostWordsTried)
    .flatMap((word, at) =>
      recogniseAt(line, at) === null ? instead(at, 1, closestWords(word.lower, verbWords, 1)) : [],
    );

const saysSomething = (line: Line): boolean =>
  line.words.some((_, at) => fillerLength(line, at) === 0 && recogniseAt(line, at) !== null);

/** Verbs put in front, for a line that lacks nothing else. */
const prefixed = (line: Line): readonly Repair[] =>
  saysSomething(line)
    ? readableVerbs
        .filter((verb) => verb !== 'help' && verb !== 'feed')
        .map((verb) => [{ first: 0, wordCount: 0, text: verb }])
    : [];

export const noVerb = (line: Line): Fault => {
  const at = line.words.findIndex(
    ({ lower }, index) => notAsked(lower) !== null && recogniseAt(line, index) === null,
  );
  const topic = notAsked(line.words[at]?.lower ?? '');
  if (topic !== null) return notAskedFault(line, at, topic);
  const misspelt = misspeltVerbs(line);
  return {
    code: 'noVerb',
    message:
      'No verb was found, so it is not clear what is asked. Begin with one, such as interval; help lists them.',
    first: 0,
    wordCount: line.words.length,
    repairs: misspelt.length > 0 ? misspelt : prefixed(line),
  };
};

const wholeLine = (line: Line, text: string): Repair => [{ first: 0, wordCount: line.words.length, text }];

/** Leaves one of the verbs and drops the others. */
const keepOnly = (kept: VerbPlace, places: readonly VerbPlace[]): Repair =>
  places
    .filter(({ verb }) => verb !== kept.verb)
    .map(({ at }): Edit => ({ first: at, wordCount: 1, text: '' }));

export const severalVerbs = (line: Line, places: readonly VerbPlace[]): Fault => {
  const [first] = places;
  const second = places.find(({ verb }) => verb !== first?.verb);
  const at = second?.at ?? 0;
  const explained = places.find(({ verb }) => verb !== 'help');
  const help = places.some(({ verb }) => verb === 'help') && explained !== undefined;
  const says = `is a second verb after ${first?.verb ?? 'the first'}. Ask one thing a line, the verb first.`;
  return {
    ...faultAt(line, at, 1, { code: 'severalVerbs', says, instead: [] }),
    repairs: [
      ...(help ? [wholeLine(line, `help ${explained.verb}`)] : []),
      ...quotedTickers(line),
      ...places.map((place) => keepOnly(place, places)),
    ],
  };
};

/** A verb that cannot be asked yet: another verb of the line or the interval, for the same tickers. */
export const notBuilt = (line: Line, places: readonly VerbPlace[]): Fault => {
  const at = places[0]?.at ?? 0;
  const tickers = line.words.flatMap((_, index) => {
    const read = recogniseAt(line, index);
    return read?.piece.kind === 'ticker' ? [`\`${read.piece.ticker}\``] : [];
  });
  const others = places.slice(1).map(({ verb }) => verb);
  const verbs = tickers.length === 0 ? [] : [...others, ...readableVerbs];
  return {
    ...faultAt(line, at, 1, cannotBeAskedYet(line.context, [])),
    repairs: verbs.slice(0, 3).map((verb) => wholeLine(line, [verb, ...tickers].join(' '))),
  };
};
