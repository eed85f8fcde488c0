import { createHash } from 'node:crypto';
import type { Answer, Answers } from './answer.ts';
import { recordIdOf } from './identity.ts';
import type { AnswerPolicy } from './policy.ts';

export type AnswerContent = { readonly policy: AnswerPolicy; readonly answers: Answers };

/** The answers as JSON without what hangs on the words of one asking: what was assumed, and the ids. */
const unnamed = ({ id: _id, assumed: _assumed, ...rest }: Answer): object => rest;

/**
 * Hex SHA-256 of what was answered, to the last bit. The same question on the same prices with the same methods and
 * policy has the same content, however it was typed.
 */
export const contentOf = ({ policy, answers }: AnswerContent): string =>
  createHash('sha256')
    .update(JSON.stringify([policy, ...answers.map(unnamed)]))
    .digest('hex');

const rename = (answer: Answer, content: string, length: number): Answer => ({
  ...answer,
  id: recordIdOf(createHash('sha256').update(`${content}\n${answer.id}`).digest(), length),
});

/** The answers under longer ids, made from their own content: for content that meets a taken id. */
export const renamed = ([first, ...others]: Answers, content: string, length: number): Answers => [
  rename(first, content, length),
  ...others.map((answer) => rename(answer, content, length)),
];
