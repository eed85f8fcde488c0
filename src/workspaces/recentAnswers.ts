import type { Answers } from '../answers/answer.ts';

const mostKept = 500;

/** The last answers given, by the id of the first of each reply, so that a button under a reply finds the very figures it stands under. The oldest goes first. */
export const recentAnswers = () => {
  const answers = new Map<string, Answers>();
  return {
    keep: (given: Answers): void => {
      const [{ id }] = given;
      answers.delete(id);
      answers.set(id, given);
      const oldest = answers.keys().next();
      if (answers.size > mostKept && oldest.done !== true) answers.delete(oldest.value);
    },
    find: (id: string): Answers | null => answers.get(id) ?? null,
  };
};
