import type { Answer } from '../answers/answer.ts';

const mostKept = 500;

/** The last answers given, so that a button under a reply finds the very figures it stands under. The oldest goes first. */
export const recentAnswers = () => {
  const answers = new Map<string, Answer>();
  return {
    keep: (answer: Answer): void => {
      answers.delete(answer.id);
      answers.set(answer.id, answer);
      const oldest = answers.keys().next();
      if (answers.size > mostKept && oldest.done !== true) answers.delete(oldest.value);
    },
    find: (id: string): Answer | null => answers.get(id) ?? null,
  };
};
