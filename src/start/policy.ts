import type { AnswerPolicy } from '../answers/policy.ts';
import type { Settings } from '../config/schema.ts';

/** What answers hang on beside questions and prices. */
export const policyOf = ({ periodsPerYear, smallestMeanThatMatters }: Settings): AnswerPolicy => ({
  periodsPerYear,
  smallestMeanThatMatters,
});
