import type { Passage, Reply } from '../present/reply.ts';
import type { Result } from '../terms/result.ts';
import type { Spoken } from './conversation.ts';
import type { Picture } from './pictures.ts';

const withPassage = (given: Reply, passage: Passage): Reply => ({
  ...given,
  passages: [...given.passages, passage],
});

/** Who sees the picture needs no button for it. */
const withoutItsButton = (given: Reply): Reply => ({
  ...given,
  buttons: given.buttons.filter(({ action }) => action !== 'picture'),
});

/**
 * What is said with its picture beside it. Where it could not be drawn that is said beside the figures, never instead of
 * them; `inText` is what stands for it there, and wherever pictures cannot be shown.
 */
export const pictured = (spoken: Spoken, drawn: Result<Picture>, inText: readonly Passage[] = []): Spoken => {
  if (drawn.ok)
    return {
      ...spoken,
      reply: withoutItsButton(spoken.reply),
      pictures: [...(spoken.pictures ?? []), { ...drawn.value, inText }],
    };
  const why: Passage = { head: null, lines: [`There is no picture: ${drawn.problem.message}`] };
  return { ...spoken, reply: [...inText, why].reduce(withPassage, spoken.reply) };
};
