import type { Answer } from '../answers/answer.ts';
import type { Problem } from '../terms/problem.ts';
import { answerReply } from './answerReply.ts';
import { inWords } from './words.ts';

/** The answer as data, with its own reply in words under `text`. */
const withText = (answer: Answer) => ({ ...answer, text: inWords(answerReply(answer)) });

const spaces = 2;

/** One answer as `{"ok": true, "answer": …}`, several as `{"ok": true, "answers": […]}`. */
export const answersToJson = (answers: readonly Answer[]): string => {
  const [only, ...others] = answers.map(withText);
  const document =
    others.length === 0 && only !== undefined
      ? { ok: true, answer: only }
      : { ok: true, answers: [only, ...others] };
  return JSON.stringify(document, null, spaces);
};

/** A refusal as `{"ok": false, "problem": …}` with exactly the documented keys. */
export const problemToJson = ({ code, message, position, suggestion }: Problem): string =>
  JSON.stringify({ ok: false, problem: { code, message, position, suggestion } }, null, spaces);
