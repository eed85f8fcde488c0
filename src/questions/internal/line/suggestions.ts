import { canonicalLine } from '../../canonicalText.ts';
import type { ReadContext } from '../../context.ts';
import { limits } from '../../limits.ts';
import type { Attempt, Fault, Repair } from '../faults/fault.ts';
import type { Line } from '../recognisers/recogniser.ts';
import { verbOfWord } from '../verbs/verbWords.ts';
import { splitWords } from '../words/splitWords.ts';
import type { Word } from '../words/word.ts';
import { readLine, type WholeLine } from './readLine.ts';

const repairedText = (words: readonly Word[], repair: Repair): string => {
  const texts: string[] = [];
  for (let at = 0; at <= words.length; at += 1) {
    for (const edit of repair) if (edit.first === at) texts.push(edit.text);
    const replaced = repair.some(({ first, wordCount }) => first <= at && at < first + wordCount);
    const word = words[at];
    if (word !== undefined && !replaced) texts.push(word.quoted ? `\`${word.text}\`` : word.text);
  }
  return texts.join(' ');
};

/** Written from the question that was read, so that nothing of the person's own text is in it. */
const writtenOut = ({ questions, wishes }: WholeLine): string =>
  [canonicalLine(questions), ...wishes.map((wish) => `as ${wish}`)].join(' ');

/** Where no repair is enough, the repaired lines' own faults are repaired in turn, this often in all. */
const mostRounds = 3;

type Read = (line: Line) => Attempt<WholeLine>;

const readableForms = (line: Line, fault: Fault, rounds: number, read: Read): readonly string[] => {
  const { context } = line;
  const forms = new Set<string>();
  const failed: { line: Line; fault: Fault }[] = [];
  for (const repair of fault.repairs) {
    if (forms.size >= limits.suggestionsPerProblem) break;
    const repaired = { words: splitWords(repairedText(line.words, repair), 0, context.vocabulary), context };
    const attempt = read(repaired);
    if (attempt.ok) forms.add(writtenOut(attempt.value));
    else failed.push({ line: repaired, fault: attempt.fault });
  }
  if (forms.size > 0 || rounds <= 1) return [...forms];
  for (const next of failed) {
    const deeper = readableForms(next.line, next.fault, rounds - 1, read);
    if (deeper.length > 0) return deeper;
  }
  return [];
};

const helpAbout = (line: Line): string => {
  const verb = line.words
    .map((word) => (word.quoted ? null : verbOfWord(word.lower)))
    .find((found) => found !== null);
  const asked = verb !== undefined && verb !== 'help' && line.context.builtVerbs.includes(verb);
  return asked ? `help ${verb}` : 'help';
};

const canHelp = (context: ReadContext): boolean => context.builtVerbs.includes('help');

/** Questions near the refused line that would work, ready to send, the nearest first; help about its verb where there is none. */
export const suggestionsFor = (line: Line, fault: Fault, read: Read = readLine): readonly string[] => {
  const short = line.words.length <= limits.wordsOfRepairedLine;
  const forms = short ? readableForms(line, fault, mostRounds, read) : [];
  if (forms.length > 0 || !canHelp(line.context)) return forms;
  return [helpAbout(line)];
};
