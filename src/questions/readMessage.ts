import { problem } from '../terms/problem.ts';
import { canonicalText } from './canonicalText.ts';
import { cleanMessage } from './cleanMessage.ts';
import type { ReadContext } from './context.ts';
import type { Fault } from './internal/faults/fault.ts';
import { beginsQuestion } from './internal/line/head.ts';
import { readLine } from './internal/line/readLine.ts';
import { suggestionsFor } from './internal/line/suggestions.ts';
import type { Line } from './internal/recognisers/recogniser.ts';
import { isOnlyFiller } from './internal/recognisers/table.ts';
import { splitLines } from './internal/words/splitLines.ts';
import { limits } from './limits.ts';
import type { Reading, ReadingProblem, ReadOutcome } from './reading.ts';

export type { QuestionDefaults, ReadContext, Vocabulary } from './context.ts';
export type { Reading, ReadingProblem, ReadOutcome } from './reading.ts';

const refused = (reason: ReadingProblem): ReadOutcome => ({ ok: false, problem: reason });

const lineProblem = (line: Line, fault: Fault): ReadingProblem => {
  const first = line.words[fault.first];
  const last = line.words[fault.first + fault.wordCount - 1];
  const position = first === undefined || last === undefined ? null : { start: first.start, end: last.end };
  const suggestions = suggestionsFor(line, fault);
  return {
    ...problem(fault.code, fault.message, { position, suggestion: suggestions[0] ?? null }),
    suggestions,
  };
};

const outcomesOf = (line: Line): readonly ReadOutcome[] => {
  const attempt = readLine(line);
  if (!attempt.ok) return [refused(lineProblem(line, attempt.fault))];
  const position = { start: line.words[0]?.start ?? 0, end: line.words[line.words.length - 1]?.end ?? 0 };
  const { questions, assumed, wishes } = attempt.value;
  return questions.map((question) => ({
    ok: true,
    value: { question, canonical: canonicalText(question), assumed, wishes, position },
  }));
};

const tooManyLines = (lines: readonly Line[]): readonly ReadOutcome[] => {
  const first = lines[limits.questionsPerMessage]?.words[0];
  if (first === undefined) return [];
  const more = lines.length - limits.questionsPerMessage;
  const message =
    `A message may hold ${limits.questionsPerMessage} questions and this one holds ${lines.length}. ` +
    `Send the last ${more === 1 ? 'one' : more} again.`;
  const position = { start: first.start, end: first.end };
  return [refused({ ...problem('tooManyLines', message, { position }), suggestions: [] })];
};

const tooLong = (length: number): ReadOutcome => {
  const most = limits.messageCharacters;
  const message = `The message has ${length} characters, and at most ${most} are read. Send the question alone.`;
  return refused({ ...problem('messageTooLong', message), suggestions: [] });
};

/**
 * Reads what a person sent. Every line that begins with a verb is a question; several tickers after a verb that
 * takes one are several questions. What cannot be read is a problem with its place and, where there is
 * one, the nearest question that would work. Never throws, whatever the text.
 * Example: `interval KELP` is the interval of KELP's mean over the default window, with `60d (default)` among `assumed`.
 */
export const readMessage = (text: string, context: ReadContext): Reading => {
  if (text.length > limits.messageCharacters) return { text: '', questions: [tooLong(text.length)] };
  const clean = cleanMessage(text, context.ownId ?? null);
  const lines = splitLines(clean.text, context.vocabulary, (words) => beginsQuestion({ words, context }))
    .map((words): Line => ({ words, context }))
    .filter((line) => !isOnlyFiller(line));
  const outcomes = lines.slice(0, limits.questionsPerMessage).flatMap(outcomesOf);
  return { text: clean.text, questions: [...outcomes, ...tooManyLines(lines)] };
};
