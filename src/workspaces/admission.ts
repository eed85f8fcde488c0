import { problem } from '../terms/problem.ts';
import { refuse } from '../terms/result.ts';
import { type Asking, type Converse, readerOf, refused, type Spoken } from './conversation.ts';
import type { Asker, Permissions, Verdict } from './permissions.ts';

/** What is said to somebody who may not have what they asked for: a private line, or nothing. */
export const denied = (verdict: Exclude<Verdict, { readonly ok: true }>): readonly Spoken[] =>
  verdict.silent ? [] : [refused(refuse(problem('notPermitted', verdict.message)))];

/** Lets somebody in, or says what is said to them instead; null where they are in. */
export const admission = async (
  permissions: Permissions,
  asker: Asker,
): Promise<readonly Spoken[] | null> => {
  await permissions.learn(asker);
  const verdict = permissions.admit(asker);
  return verdict.ok ? null : denied(verdict);
};

type Put = Pick<Asking, 'place' | 'from'>;

type Addressed = Pick<Converse, 'ask' | 'press'>;

/** The same conversation behind a door: every message and every press is let in first. */
export const behindDoor = (permissions: Permissions, converse: Addressed): Addressed => {
  const within =
    <T extends Put>(answer: (put: T) => Promise<readonly Spoken[]>) =>
    async (put: T): Promise<readonly Spoken[]> =>
      (await admission(permissions, readerOf(put))) ?? answer(put);
  return { ask: within(converse.ask), press: within(converse.press) };
};
