import { topicNamed, topicWords } from '../../help/topics.ts';
import { attained } from '../faults/fault.ts';
import { firstOf } from '../pieces/piece.ts';
import { faultAt, found, foundFault, type Recogniser } from '../recognisers/recogniser.ts';
import { cannotBeAskedYet } from './notBuilt.ts';
import { settleLevels } from './settle.ts';
import type { VerbReader } from './verbReader.ts';
import { verbOfWord } from './verbWords.ts';

/** What help explains: a verb, a part of the language, or something that cannot be asked; two words before one. */
const topic: Recogniser = (line, at) => {
  const [first, second] = [line.words[at], line.words[at + 1]];
  if (first === undefined || first.quoted) return null;
  const verb = verbOfWord(first.lower);
  if (verb !== null && !line.context.builtVerbs.includes(verb))
    return foundFault(faultAt(line, at, 1, cannotBeAskedYet(line.context, [''])), 1);
  const both = second === undefined ? null : topicNamed(`${first.lower} ${second.lower}`);
  if (both !== null) return found({ kind: 'topic', topic: both.name }, 2);
  const one = topicNamed(verb ?? first.lower);
  return one === null ? null : found({ kind: 'topic', topic: one.name }, 1);
};

export const help: VerbReader = {
  verb: 'help',
  takes: new Set(['topic']),
  tickers: { least: 0, most: 0 },
  recognise: topic,
  ownWords: topicWords,
  settle: settleLevels,
  read: ({ pieces }) =>
    attained({ questions: [{ verb: 'help', topic: firstOf(pieces, 'topic')?.topic ?? null }], assumed: [] }),
};
