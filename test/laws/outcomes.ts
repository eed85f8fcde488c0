import type { Result } from '../../src/terms/result.ts';

/** The value of an outcome that must be one; a refusal makes the test fail with its own message. */
export const accepted = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`refused: ${result.problem.code}: ${result.problem.message}`);
  return result.value;
};

/** The code of an outcome that must be a refusal, or 'not refused'. */
export const refusalCode = (result: Result<unknown>): string =>
  result.ok ? 'not refused' : result.problem.code;

/** The sentence of an outcome that must be a refusal. It begins with the figure that cannot be had. */
export const refusalMessage = (result: Result<unknown>): string =>
  result.ok ? 'not refused' : result.problem.message;
