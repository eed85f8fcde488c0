import type { Day } from '../terms/day.ts';
import type { Level } from '../terms/level.ts';
import type { Window } from '../terms/window.ts';
import type { TailModel } from './question.ts';

/** What the reader of questions must know of the feed and the desk. */
export type Vocabulary = {
  /** The ticker as the feed writes it, whatever case the word was typed in; null where the feed has none. */
  readonly canonicalTicker: (word: string) => string | null;
  /** Tickers of the feed closest to the word, the closest first; for an empty word the first of the feed. */
  readonly nearest: (word: string, count: number) => readonly string[];
  /** IANA time zones by the city that the desk names them with, in small letters. */
  readonly cities?: ReadonlyMap<string, string>;
};

type WindowAndLevel = { readonly window: Window; readonly level: Level };

/** What is taken where a question does not say it. The values come from configuration. */
export type QuestionDefaults = {
  readonly interval: WindowAndLevel;
  readonly claim: WindowAndLevel;
  readonly need: WindowAndLevel & { readonly power: Level };
  readonly compare: WindowAndLevel;
  /** `confidence` is the level of the interval around a tail figure. */
  readonly tail: WindowAndLevel & { readonly confidence: Level; readonly horizonDays: number };
  readonly shape: { readonly window: Window; readonly confidence: Level };
  /** `window` holds the days that are judged, `estimationReturns` the returns behind each day's figure. */
  readonly backtest: WindowAndLevel & { readonly estimationReturns: number };
  /** `minutes` after midnight and the zone of a scheduled post; the figures that it and a watch are about. */
  readonly digest: WindowAndLevel & {
    readonly model: TailModel;
    readonly minutes: number;
    readonly timeZone: string;
  };
};

export type ReadContext = {
  readonly vocabulary: Vocabulary;
  /** The day on which the question is asked, where the desk is. */
  readonly today: Day;
  readonly defaults: QuestionDefaults;
  /** The verbs that can be answered now. */
  readonly builtVerbs: readonly string[];
  /** The bot's own id on the platform: its mention is skipped wherever it stands, not only at the head. */
  readonly ownId?: string;
};
