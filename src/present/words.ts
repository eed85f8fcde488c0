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

/** The whole reply as running words: what a notification shows and a screen reader reads. */
export const inWords = (reply: Reply): string => {
  const further = furtherWarnings(reply);
  return [
    ended(reply.sentence),
    ...(reply.figuresInWords === '' ? [] : [ended(reply.figuresInWords)]),
    ...reply.passages.map(({ head, lines }) => [...(head === null ? [] : [head]), ...lines].join('\n')),
    ...shownWarnings(reply).map((warning) => `Caution: ${ended(warning)}`),
    ...(further === null ? [] : [ended(further.charAt(0).toUpperCase() + further.slice(1))]),
    ...(reply.quietLine === null ? [] : [ended(reply.quietLine)]),
    ...(reply.caution === null ? [] : [reply.caution]),
  ].join('\n');
};
