import { closestWords } from '../../closestWords.ts';
import { type TailModel, tailModels } from '../../question.ts';
import { faultAt, found, foundFault, type Recogniser } from './recogniser.ts';

/** What the models are called elsewhere, for suggestions only. */
const otherNames: ReadonlyMap<string, TailModel> = new Map([
  ['empirical', 'historical'],
  ['hs', 'historical'],
  ['gaussian', 'normal'],
  ['t', 'student'],
  ['garch', 'filtered'],
  ['ewma', 'filtered'],
  ['evt', 'peaks'],
  ['gpd', 'peaks'],
  ['pot', 'peaks'],
]);

export const modelNamed = (lower: string): TailModel | null =>
  tailModels.find((model) => model === lower) ?? null;

/** Models that the word may have meant, the likeliest first. */
export const modelsNear = (lower: string): readonly string[] => {
  const other = otherNames.get(lower);
  return other === undefined ? closestWords(lower, tailModels, 1) : [other];
};

/** `by student`. */
export const model: Recogniser = (line, at) => {
  const word = line.words[at + 1];
  const named = word === undefined ? null : modelNamed(word.lower);
  if (named !== null) return found({ kind: 'model', model: named }, 2);
  const near = word === undefined ? [] : modelsNear(word.lower).map((name) => `by ${name}`);
  const wordCount = near.length === 0 || word === undefined ? 1 : 2;
  const says = `needs one of the models after it: ${tailModels.join(', ')}.`;
  return foundFault(
    faultAt(line, at, wordCount, { code: 'missingPart', says, instead: [...near, ''] }),
    wordCount,
  );
};
