import { subjectText, writeQuestion } from './internal/canonical/writeQuestion.ts';
import type { Question } from './question.ts';

/**
 * The question written out in full in one fixed form, itself a line that is read as the same question.
 * Example: `interval KELP 60d at 95%` for the interval of KELP's mean that nothing else was said about.
 */
export const canonicalText = (question: Question): string => writeQuestion(question, subjectText(question));

/** One line for questions that differ in their ticker alone. Empty where there is no question. */
export const canonicalLine = (questions: readonly Question[]): string => {
  const [first] = questions;
  return first === undefined ? '' : writeQuestion(first, questions.map(subjectText).join(' '));
};
