import { quantityAt, scaledDecimal } from '../words/numbers.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';
import { sizeUnits } from './sizes.ts';

/** The tail figures by the names that the trade has for them; `tail` alone is VaR. */
const figures: ReadonlyMap<string, 'var' | 'es'> = new Map([
  ['tail', 'var'],
  ['var', 'var'],
  ['es', 'es'],
]);

/** `loss beyond tail`: a plain word for a day that is worse than the tail figure. */
const loss: Recogniser = (line, at) => {
  const [second, third] = [line.words[at + 1]?.lower, line.words[at + 2]?.lower];
  const whole = second === 'beyond' && (third === 'tail' || third === 'var');
  if (whole) return found({ kind: 'watched', watched: 'loss' }, 3);
  const wordCount = second === 'beyond' ? 2 : 1;
  const says = 'is watched against the tail figure. Write loss beyond tail.';
  return foundFault(
    faultAt(line, at, wordCount, { code: 'missingPart', says, instead: ['loss beyond tail'] }),
    wordCount,
  );
};

export const watched: Recogniser = (line, at) => {
  const word = line.words[at];
  if (word === undefined || word.quoted) return null;
  if (word.lower === 'loss' || word.lower === 'losses') return loss(line, at);
  const figure = figures.get(word.lower);
  return figure === undefined ? null : found({ kind: 'watched', watched: figure }, 1);
};

/** `above 4%`, `below 150bp`: the line that a figure crosses. */
export const crossing: Recogniser = (line, at) => {
  const side = line.words[at]?.lower;
  if (side !== 'above' && side !== 'below') return null;
  const size = quantityAt(line.words, at + 1, sizeUnits);
  const fraction = size === null ? Number.NaN : scaledDecimal(size.decimal, size.unit);
  const wordCount = 1 + (size?.wordCount ?? 0);
  if (fraction > 0 && fraction < 1)
    return found({ kind: 'crossing', crossing: { side, fraction } }, wordCount);
  const says =
    size === null
      ? `needs a loss after it, such as ${side} 4%.`
      : 'is not a loss. Give more than 0% and less than 100%, without a sign.';
  const code = size === null ? 'missingPart' : 'sizeOutside';
  return foundFault(faultAt(line, at, wordCount, { code, says, instead: [`${side} 4%`] }), wordCount);
};
