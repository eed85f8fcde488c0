import { platformLimits } from '../../present/limits/platformLimits.ts';
import { type AskField, askForm as askFormView, tickerOptions } from '../../present/views/askForm.ts';
import type { Option, ShownOption, View } from '../../present/views/parts.ts';
import { type ReadOutcome, readMessage } from '../../questions/readMessage.ts';
import { type Asking, readerOf } from '../conversation.ts';
import type { Desk } from '../desk.ts';
import { tickersLike } from './tickersLike.ts';

/** What stands in the fields; null where one is empty. */
export type AskValues = Readonly<Record<AskField, string | null>>;

export type AskFaults = Partial<Readonly<Record<AskField, string>>>;

export type ReadForm =
  | { readonly ok: true; readonly question: string }
  /** What is wrong, at the field where it can be put right. */
  | { readonly ok: false; readonly faults: AskFaults };

type Asker = Pick<Asking, 'place' | 'from'>;

export type AskForm = {
  /** From memory alone: a form has to stand within three seconds of the press. */
  readonly view: (values: AskValues) => View;
  /** Tickers of the feed, for who may ask in the chosen place or directly. */
  readonly tickers: (askers: readonly Asker[], typed: string) => readonly ShownOption[];
  /** The question that the fields make, where it may be asked in the chosen place. */
  readonly read: (asker: Asker, values: AskValues) => ReadForm;
};

export const emptyForm: AskValues = { verb: null, ticker: null, window: null, level: null, place: null };

/** What can be asked of a ticker with nothing but a window and a level: words of the language. */
const verbs: readonly Option[] = [
  { value: 'interval', text: 'Where can the true mean lie? (interval)' },
  { value: 'interval vol', text: 'And the true volatility? (interval vol)' },
  { value: 'interval ratio', text: 'And the ratio of the two? (interval ratio)' },
  { value: 'tail', text: 'How bad can a day be? (tail)' },
  { value: 'shape', text: 'How fat are the tails? (shape)' },
  { value: 'backtest', text: 'Did the tail figure hold up? (backtest)' },
];

const levels: readonly Option[] = ['90%', '95%', '97.5%', '99%', '99.9%'].map((level) => ({
  value: level,
  text: level,
}));

const startNote = 'Choose a ticker; the question that the fields make is shown here.';

type Written = { readonly text: string; readonly from: readonly (readonly [AskField, number])[] };

/** The fields as one line of the language, with where each begins in it. */
const written = ({ verb, ticker, window, level }: AskValues): Written => {
  const word = verb === 'shape' ? 'confidence' : 'at';
  const parts: readonly (readonly [AskField, string])[] = [
    ['verb', verb ?? 'interval'],
    ['ticker', `\`${ticker ?? ''}\``],
    ['window', window?.trim() ?? ''],
    ['level', level === null ? '' : `${word} ${level}`],
  ];
  let text = '';
  const from: (readonly [AskField, number])[] = [];
  for (const [field, part] of parts) {
    if (part === '') continue;
    from.push([field, text.length]);
    text += `${part} `;
  }
  return { text: text.trimEnd(), from };
};

/** The field in which a problem stands; one about the whole line is the window's, the only field that is typed. */
const faultAt = (outcome: ReadOutcome, { from }: Written): AskFaults => {
  if (outcome.ok) return {};
  const { position, message } = outcome.problem;
  const at = position === null || position.start === 0 ? null : position.start;
  const field = at === null ? 'window' : (from.findLast(([, start]) => start <= at)?.[0] ?? 'window');
  return { [field]: message };
};

const manyQuestions = 'Write one window, such as 60d, and nothing else.';

/** What can be asked with a form, and whether it is right so far. */
export const createAskForm = (desk: Desk): AskForm => {
  const questionOf = (values: AskValues): ReadForm => {
    const live = desk.snapshot();
    if (!live.ok) return { ok: false, faults: { ticker: live.problem.message } };
    if (values.ticker === null) return { ok: false, faults: { ticker: 'Choose a ticker.' } };
    const line = written(values);
    const [outcome, another] = readMessage(line.text, desk.contextFor(live.value)).questions;
    if (outcome === undefined || another !== undefined)
      return { ok: false, faults: { window: manyQuestions } };
    return outcome.ok
      ? { ok: true, question: outcome.value.canonical }
      : { ok: false, faults: faultAt(outcome, line) };
  };

  const noteFor = (values: AskValues): string => {
    if (values.ticker === null) return startNote;
    const read = questionOf(values);
    return read.ok ? `Asks: ${read.question}` : (Object.values(read.faults)[0] ?? startNote);
  };

  return {
    view: (values) => askFormView({ verbs, levels, note: noteFor(values) }),
    tickers: (askers, typed) => {
      const live = desk.snapshot();
      const may = askers.some((asker) => desk.permissions.mayAsk(readerOf(asker), 'interval').ok);
      const known = live.ok && may ? live.value.tickers : [];
      return tickerOptions(tickersLike(typed, known, platformLimits.select.options));
    },
    read: (asker, values) => {
      const read = questionOf(values);
      if (!read.ok) return read;
      const verdict = desk.permissions.mayAsk(
        readerOf(asker),
        (values.verb ?? 'interval').split(' ')[0] ?? '',
      );
      if (verdict.ok) return read;
      return {
        ok: false,
        faults: {
          place: verdict.silent ? 'Nothing is answered there. Choose another place.' : verdict.message,
        },
      };
    },
  };
};
