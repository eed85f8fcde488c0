import type { Problem } from './problem.ts';

/** An outcome that callers are expected to branch on. Exceptions are kept for bugs and broken machinery. */
export type Result<T> = { readonly ok: true; readonly value: T } | Refusal;

/** The refused half of a {@link Result}. */
export type Refusal = { readonly ok: false; readonly problem: Problem };

export const succeed = <T>(value: T): Result<T> => ({ ok: true, value });

export const refuse = (problem: Problem): Refusal => ({ ok: false, problem });

/** The value, or null where it was refused and the reason does not matter to the caller. */
export const valueOrNull = <T>(result: Result<T>): T | null => (result.ok ? result.value : null);
