import type { Answers } from '../answers/answer.ts';
import type { AnswerJob } from '../answers/answerQuestion.ts';
import { answersReply, jsonReply, workingReplies } from '../present/answerReply.ts';
import { feedReply, stalenessInWords, tickerReply } from '../present/compose/feed.ts';
import { type HelpPage, helpReply } from '../present/compose/help.ts';
import { refusalReply } from '../present/compose/refusal.ts';
import { type Button, type Reply, reply } from '../present/reply.ts';
import type { Question, ReadQuestion, StatisticalQuestion } from '../questions/question.ts';
import { type ReadContext, type ReadOutcome, readMessage } from '../questions/readMessage.ts';
import type { FeedStatus, Freshness } from '../terms/feedReport.ts';
import type { PriceSeries, PriceSnapshot } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../terms/result.ts';
import { recentAnswers } from './recentAnswers.ts';

/** A message that was addressed to the bot. `progress` is told, in words, how far a long answer has come. */
export type Asking = {
  readonly text: string;
  readonly place: 'channel' | 'direct' | 'command' | 'terminal';
  readonly progress?: (words: string) => void;
};

/** What the bot says to one question, and the outcome behind it where it was a statistical one. */
export type Spoken = { readonly reply: Reply; readonly outcome: Result<Answers> | null };

export type Converse = {
  readonly ask: (asking: Asking) => Promise<readonly Spoken[]>;
  readonly press: (button: Pick<Button, 'action' | 'answerId' | 'question'>) => Promise<readonly Reply[]>;
};

/** What a conversation needs of the rest of the house. */
export type Desk = {
  /** The live snapshot of the feed, or why there is none. Each question takes it once and ends on it. */
  readonly snapshot: () => Result<PriceSnapshot>;
  readonly contextFor: (snapshot: PriceSnapshot | null) => ReadContext;
  readonly compute: (
    job: Pick<AnswerJob, 'read' | 'series'>,
    progress?: (words: string) => void,
  ) => Promise<Result<Answers>>;
  readonly feedStatus: () => FeedStatus;
  /** IANA zone in which instants are shown. */
  readonly timeZone: string;
  readonly helpPage: (topic: string | null) => HelpPage;
};

const said = (spokenReply: Reply): Spoken => ({ reply: spokenReply, outcome: null });

const refused = (outcome: Refusal): Spoken => ({
  reply: refusalReply(outcome.problem),
  outcome,
});

/** The tickers a question is about, in its own order. */
const subjectOf = (question: StatisticalQuestion): readonly string[] =>
  question.verb === 'compare' && question.between === 'tickers' ? question.tickers : [question.ticker];

const isStatistical = (question: Question): question is StatisticalQuestion =>
  question.verb !== 'help' && question.verb !== 'feed';

const seriesOf = (snapshot: PriceSnapshot, tickers: readonly string[]): Result<readonly PriceSeries[]> => {
  const found: PriceSeries[] = [];
  for (const ticker of tickers) {
    const series = snapshot.series(ticker);
    const reason = snapshot.quarantined.get(ticker);
    if (series === null && reason !== undefined) return refuse(problem('quarantined', reason));
    if (series === null)
      return refuse(
        problem('unknownTicker', `${ticker} is not in the feed. Ask feed for the tickers that are.`),
      );
    found.push(series);
  }
  return succeed(found);
};

/** A picture cannot be had yet, and that is said beside the figures rather than instead of them. */
const withoutPicture = (given: Reply): Reply => ({
  ...given,
  passages: [
    ...given.passages,
    { head: null, lines: ['A picture cannot be drawn yet; these are the figures.'] },
  ],
});

const asWished = ({ wishes }: ReadQuestion, answers: Answers): Reply => {
  const given = wishes.includes('json') ? jsonReply(answers) : answersReply(answers);
  return wishes.includes('picture') ? withoutPicture(given) : given;
};

/** Old prices are said before anything else is warned of. It hangs on the hour of asking, so it is no part of the answer. */
const withStaleness = (given: Reply, freshness: Freshness | null): Reply => {
  const stale = stalenessInWords(freshness);
  return stale === null ? given : { ...given, warnings: [stale, ...given.warnings] };
};

/** One conversation for every workspace: text in, replies out. */
export const createConverse = (desk: Desk): Converse => {
  const recent = recentAnswers();

  const answerStatistical = async (
    read: ReadQuestion,
    question: StatisticalQuestion,
    snapshot: PriceSnapshot,
    progress?: (words: string) => void,
  ): Promise<Spoken> => {
    const series = seriesOf(snapshot, subjectOf(question));
    if (!series.ok) return refused(series);
    const outcome = await desk.compute({ read, series: series.value }, progress);
    if (!outcome.ok) return refused(outcome);
    recent.keep(outcome.value);
    return { reply: withStaleness(asWished(read, outcome.value), desk.feedStatus().freshness), outcome };
  };

  const answerFeed = (ticker: string | null): Spoken => {
    const status = desk.feedStatus();
    if (ticker === null) return said(feedReply(status, desk.timeZone));
    const report = status.report?.tickers.find((each) => each.ticker === ticker);
    return report === undefined
      ? refused(
          refuse(
            problem('unknownTicker', `${ticker} is not in the feed. Ask feed for the tickers that are.`),
          ),
        )
      : said(tickerReply(report, status.freshness));
  };

  const answerOne = async (
    read: ReadQuestion,
    live: Result<PriceSnapshot>,
    progress?: (words: string) => void,
  ): Promise<Spoken> => {
    const { question } = read;
    if (question.verb === 'help') return said(helpReply(desk.helpPage(question.topic)));
    if (isStatistical(question))
      return live.ok ? answerStatistical(read, question, live.value, progress) : refused(live);
    return answerFeed(question.ticker);
  };

  const ask = async ({ text, progress }: Asking): Promise<readonly Spoken[]> => {
    const live = desk.snapshot();
    const { questions } = readMessage(text, desk.contextFor(live.ok ? live.value : null));
    const needsNoPrices = (outcome: ReadOutcome) =>
      outcome.ok && ['help', 'feed'].includes(outcome.value.question.verb);
    // Without prices no ticker is known, so whatever was made of the words, the missing feed is what to say.
    if (!live.ok && !questions.some(needsNoPrices)) return questions.length === 0 ? [] : [refused(live)];
    const spoken: Spoken[] = [];
    for (const outcome of questions)
      spoken.push(outcome.ok ? await answerOne(outcome.value, live, progress) : refused(outcome));
    return spoken;
  };

  const press: Converse['press'] = async ({ answerId, question }) => {
    const kept = recent.find(answerId);
    if (kept !== null) return workingReplies(kept);
    const replies: Reply[] = [];
    for (const { outcome } of await ask({ text: question, place: 'terminal' })) {
      if (outcome?.ok !== true) continue;
      const [{ id }] = outcome.value;
      if (id !== answerId)
        replies.push(
          reply(
            'refusal',
            `The prices have changed since ${answerId} was given; this is the working of the same question today, ${id}.`,
          ),
        );
      replies.push(...workingReplies(outcome.value));
    }
    return replies.length > 0
      ? replies
      : [
          reply(
            'refusal',
            `${answerId} cannot be worked out again on the prices of today. Ask the question anew.`,
          ),
        ];
  };

  return { ask, press };
};
