import { type Position, type ProblemCode, problem } from '../terms/problem.ts';
import { canonicalLine, canonicalText } from './canonicalText.ts';
import { cleanMessage } from './cleanMessage.ts';
import type { ReadContext } from './context.ts';
import type { Attempt, Fault } from './internal/faults/fault.ts';
import { readFollowUp } from './internal/followUp/readFollowUp.ts';
import { beginsQuestion } from './internal/line/head.ts';
import { readLine, type WholeLine } from './internal/line/readLine.ts';
import { suggestionsFor } from './internal/line/suggestions.ts';
import type { Line } from './internal/recognisers/recogniser.ts';
import { isOnlyFiller } from './internal/recognisers/table.ts';
import { splitLines } from './internal/words/splitLines.ts';
import { limits } from './limits.ts';
import type { StatisticalQuestion } from './question.ts';
import type { Reading, ReadOutcome } from './reading.ts';

export type { QuestionDefaults, ReadContext, Vocabulary } from './context.ts';
export type { Reading, ReadingProblem, ReadOutcome } from './reading.ts';

const refused = (
  code: ProblemCode,
  message: string,
  suggestions: readonly string[],
  position: Position | null,
): ReadOutcome => ({
  ok: false,
  problem: { ...problem(code, message, { position, suggestion: suggestions[0] ?? null }), suggestions },
});

type Read = (line: Line) => Attempt<WholeLine>;

const lineRefused = (line: Line, fault: Fault, read: Read): ReadOutcome => {
  const first = line.words[fault.first];
  const last = line.words[fault.first + fault.wordCount - 1];
  const position = first === undefined || last === undefined ? null : { start: first.start, end: last.end };
  return refused(fault.code, fault.message, suggestionsFor(line, fault, read), position);
};

const outcomesOf = (line: Line, read: Read): readonly ReadOutcome[] => {
  const attempt = read(line);
  if (!attempt.ok) return [lineRefused(line, attempt.fault, read)];
  const position = { start: line.words[0]?.start ?? 0, end: line.words[line.words.length - 1]?.end ?? 0 };
  const { questions, assumed, wishes } = attempt.value;
  return questions.map((question) => ({
    ok: true,
    value: { question, canonical: canonicalText(question), assumed, wishes, position },
  }));
};

/** The first question that is not answered is written out, to be sent again. */
const tooManyLines = (lines: readonly Line[]): readonly ReadOutcome[] => {
  const [next] = lines.slice(limits.questionsPerMessage);
  const first = next?.words[0];
  if (next === undefined || first === undefined) return [];
  const attempt = readLine(next);
  const suggestions = attempt.ok ? [canonicalLine(attempt.value.questions)] : [];
  const more = lines.length - limits.questionsPerMessage;
  const message =
    `A message may hold ${limits.questionsPerMessage} questions and this one holds ${lines.length}. ` +
    `Send the last ${more === 1 ? 'one' : more} again.`;
  return [refused('tooManyLines', message, suggestions, { start: first.start, end: first.end })];
};

const tooLong = (length: number, context: ReadContext): ReadOutcome => {
  const message = `The message has ${length} characters, and at most ${limits.messageCharacters} are read. Send the question alone.`;
  return refused('messageTooLong', message, context.builtVerbs.includes('help') ? ['help'] : [], null);
};

/** How a line is read after a question that was answered before it in the same place; null: after none. */
const readAfter =
  (previous: StatisticalQuestion | null): Read =>
  (line) =>
    (previous === null ? null : readFollowUp(line, previous)) ?? readLine(line);

/**
 * Reads what a person sent. Every line that begins with a verb is a question; several tickers after a verb that
 * takes one are several questions. What cannot be read is a problem with its place and, where there is
 * one, the nearest question that would work. Never throws, whatever the text.
 * After a `previous` question a line that is no whole one carries over from it what it does not say itself.
 * Example: `interval KELP` is the interval of KELP's mean over the default window, with `60d (default)` among `assumed`.
 */
export const readMessage = (
  text: string,
  context: ReadContext,
  previous: StatisticalQuestion | null = null,
): Reading => {
  if (text.length > limits.messageCharacters) return { text: '', questions: [tooLong(text.length, context)] };
  const clean = cleanMessage(text, context.ownId ?? null);
  const lines = splitLines(clean.text, context.vocabulary, (words) => beginsQuestion({ words, context }))
    .map((words): Line => ({ words, context }))
    .filter((line) => !isOnlyFiller(line));
  const outcomes = lines
    .slice(0, limits.questionsPerMessage)
    .flatMap((line) => outcomesOf(line, readAfter(previous)));
  return { text: clean.text, questions: [...outcomes, ...tooManyLines(lines)] };
};
