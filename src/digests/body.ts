import { canonicalText } from '../questions/canonicalText.ts';
import type {
  BacktestQuestion,
  Crossing,
  SubscriptionQuestion,
  TailModel,
  TailQuestion,
} from '../questions/question.ts';
import type { Level } from '../terms/level.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { Subscription } from '../terms/subscriptions.ts';
import type { Window } from '../terms/window.ts';

const bodyVersion = 1;

/** What a digest says of each ticker, with every default filled in when it was made. */
export type DigestBody = {
  readonly bodyVersion: typeof bodyVersion;
  readonly tickers: readonly string[];
  readonly window: Window;
  readonly tailLevel: Level;
  readonly confidence: Level;
  readonly model: TailModel;
  /** The returns behind each day’s figure where the days are judged. */
  readonly estimationReturns: number;
};

/** What a watch holds against its line, with every default filled in when it was made. */
export type WatchBody = {
  readonly bodyVersion: typeof bodyVersion;
  readonly watched: 'var' | 'es' | 'loss';
  readonly crossing: Crossing | null;
  readonly tail: TailQuestion;
};

export const digestBody = (given: Omit<DigestBody, 'bodyVersion'>): DigestBody => ({ bodyVersion, ...given });

export const watchBody = (given: Omit<WatchBody, 'bodyVersion'>): WatchBody => ({ bodyVersion, ...given });

/** A body of another form was kept by another version of the program. */
const read = <Body extends { readonly bodyVersion: number }>({
  id,
  body,
}: Pick<Subscription, 'id' | 'body'>): Result<Body> => {
  // written by the functions above
  const found: Body = JSON.parse(body);
  return found.bodyVersion === bodyVersion
    ? succeed(found)
    : refuse(
        problem(
          'storeUnavailable',
          `${id} was kept in a form that this version does not read. Stop it and make it anew.`,
        ),
      );
};

export const readDigestBody = (subscription: Pick<Subscription, 'id' | 'body'>): Result<DigestBody> =>
  read<DigestBody>(subscription);

export const readWatchBody = (subscription: Pick<Subscription, 'id' | 'body'>): Result<WatchBody> =>
  read<WatchBody>(subscription);

/** Days that are judged: a year of sessions, as the supervisor’s zones have it. */
const daysJudged = 250;

/** A history shorter than the window is taken whole, so that a young ticker has a line too. */
export const tailOf = (body: DigestBody, ticker: string): TailQuestion => ({
  verb: 'tail',
  ticker,
  window: body.window,
  windowAsked: false,
  returnType: 'simple',
  tailLevel: body.tailLevel,
  confidence: body.confidence,
  horizonDays: 1,
  exposure: null,
  model: body.model,
  beyond: null,
});

export const backtestOf = (body: DigestBody, ticker: string): BacktestQuestion => ({
  verb: 'backtest',
  ticker,
  window: { kind: 'returns', count: daysJudged },
  windowAsked: true,
  returnType: 'simple',
  tailLevel: body.tailLevel,
  estimationReturns: body.window.kind === 'returns' ? body.window.count : body.estimationReturns,
  model: body.model,
});

/** The canonical questions of a digest. */
export const questionsOf = (body: DigestBody): readonly string[] =>
  body.tickers.flatMap((ticker) => [
    canonicalText(tailOf(body, ticker)),
    canonicalText(backtestOf(body, ticker)),
  ]);

/** The line that would make the same digest or watch anew. */
export const asksOf = (subscription: Subscription): string => {
  const asked = askedAnew(subscription);
  return asked === null ? subscription.questions.join(', ') : canonicalText(asked);
};

const askedAnew = (subscription: Subscription): SubscriptionQuestion | null => {
  const { kind, schedule } = subscription;
  if (kind === 'watch') {
    const body = readWatchBody(subscription);
    if (!body.ok) return null;
    const { watched, crossing, tail } = body.value;
    return { verb: 'watch', do: 'add', watched, crossing, tail };
  }
  const body = readDigestBody(subscription);
  if (!body.ok || schedule === null) return null;
  const { tickers, window, tailLevel, model } = body.value;
  return { verb: 'digest', do: 'add', tickers, schedule, window, tailLevel, model };
};
