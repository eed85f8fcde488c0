import { namedTimeZone } from '../../../../terms/zonedTime.ts';
import { closestWords } from '../../../closestWords.ts';
import { faultAt, found, foundFault, type Line, type Recogniser } from '../recogniser.ts';

/** The most parts that a zone of the IANA database has: `America/Argentina/Ushuaia`. */
const mostParts = 3;

/** How many words from `at` on were one word with slashes in it as it was typed, at most so many. */
const slashedLength = ({ words }: Line, at: number): number => {
  let length = 1;
  while (length < mostParts) {
    const [last, next] = [words[at + length - 1], words[at + length]];
    if (last === undefined || next === undefined || next.start !== last.end + 1) break;
    if (next.quoted || last.quoted) break;
    length += 1;
  }
  return length;
};

const joined = ({ words }: Line, at: number, length: number, mark: string): string =>
  words
    .slice(at, at + length)
    .map(({ text }) => text)
    .join(mark);

let known: readonly string[] | null = null;

/** Areas that zones are named under. */
const isArea = (text: string): boolean => {
  known ??= Intl.supportedValuesOf('timeZone');
  return known.some((zone) => zone.toLowerCase().startsWith(`${text.toLowerCase()}/`));
};

const mostNear = 2;

/** A word that was typed with a slash after an area of the world, but is no zone of it. */
const unknownZone: Recogniser = (line, at) => {
  const length = slashedLength(line, at);
  if (length === 1 || !isArea(line.words[at]?.text ?? '')) return null;
  const near = closestWords(joined(line, at, length, '/'), known ?? [], mostNear);
  const says = 'is not a time zone that is known. Write one such as Europe/London.';
  return foundFault(faultAt(line, at, length, { code: 'badTime', says, instead: [...near, ''] }), length);
};

/** Cities as the desk names them, in one word or two; a ticker of the same name is the ticker. */
const cityAt: Recogniser = (line, at) => {
  const { canonicalTicker, cities } = line.context.vocabulary;
  for (const length of [2, 1]) {
    const name = joined(line, at, length, ' ');
    const timeZone = cities?.get(name.toLowerCase());
    if (timeZone === undefined || (length === 1 && canonicalTicker(name) !== null)) continue;
    return found({ kind: 'timeZone', timeZone }, length, `${name} read as ${timeZone}`);
  }
  return null;
};

/** A zone of the IANA database by its name, or a city of the desk. */
export const zone: Recogniser = (line, at) => {
  const word = line.words[at];
  if (word === undefined || word.quoted || !/^[a-z]/i.test(word.text)) return null;
  if (word.lower === 'utc') return found({ kind: 'timeZone', timeZone: 'UTC' }, 1);
  for (let length = slashedLength(line, at); length > 1; length -= 1) {
    const timeZone = namedTimeZone(joined(line, at, length, '/'));
    if (timeZone !== null) return found({ kind: 'timeZone', timeZone }, length);
  }
  return cityAt(line, at) ?? unknownZone(line, at);
};
