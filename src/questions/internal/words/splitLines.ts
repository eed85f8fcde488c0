import type { Vocabulary } from '../../context.ts';
import { splitWords } from './splitWords.ts';
import type { Word } from './word.ts';

/** What a platform puts before the lines of a quotation or a list. */
const lineHead = /^[\s>]*(?:\d{1,2}[.)]\s+)?/;

/**
 * The words of each question: a line that begins with a verb begins a question, any other goes on with the one
 * before. `beginsQuestion` judges a line by its words.
 */
export const splitLines = (
  text: string,
  vocabulary: Vocabulary,
  beginsQuestion: (words: readonly Word[]) => boolean,
): readonly (readonly Word[])[] => {
  const questions: Word[][] = [];
  let offset = 0;
  for (const line of text.split('\n')) {
    const headLength = lineHead.exec(line)?.[0].length ?? 0;
    const words = splitWords(line.slice(headLength), offset + headLength, vocabulary);
    const current = questions[questions.length - 1];
    if (current === undefined || beginsQuestion(words)) questions.push([...words]);
    else current.push(...words);
    offset += line.length + 1;
  }
  return questions.filter((words) => words.length > 0);
};
