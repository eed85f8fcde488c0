import { counted } from '../wording/words.ts';
import { type Reply, warningsShown } from './reply.ts';

/** Ends a sentence that has no ending of its own. */
const ended = (text: string): string => (/[.!?:]$/.test(text) ? text : `${text}.`);

/** The warnings that stand in the reply, and one line for those that do not. */
export const shownWarnings = (reply: Reply): readonly string[] => reply.warnings.slice(0, warningsShown);

export const furtherWarnings = (reply: Reply): string | null => {
  const rest = reply.warnings.length - warningsShown;
  return rest > 0 ? `and ${counted(rest, 'more caution')} with the working` : null;
};

/** A reply as running words in three parts, a line each: the verdict and its figures, what is told at length, and the foot. */
export const partsInWords = (reply: Reply) => {
  const further = furtherWarnings(reply);
  return {
    head: [ended(reply.sentence), ...(reply.figuresInWords === '' ? [] : [ended(reply.figuresInWords)])],
    body: reply.passages.flatMap(({ head, lines }) => [...(head === null ? [] : [head]), ...lines]),
    foot: [
      ...shownWarnings(reply).map((warning) => `Caution: ${ended(warning)}`),
      ...(further === null ? [] : [ended(further.charAt(0).toUpperCase() + further.slice(1))]),
      ...(reply.quietLine === null ? [] : [ended(reply.quietLine)]),
      ...(reply.caution === null ? [] : [reply.caution]),
    ],
  };
};

/** The whole reply as running words: what goes on record, and what a program is given. */
export const inWords = (reply: Reply): string => {
  const { head, body, foot } = partsInWords(reply);
  return [...head, ...body, ...foot].join('\n');
};
