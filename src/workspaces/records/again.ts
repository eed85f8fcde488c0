import type { Answers } from '../../answers/answer.ts';
import { methodVersion } from '../../answers/answer.ts';
import type { AnswerJob } from '../../answers/answerQuestion.ts';
import { contentOf } from '../../answers/content.ts';
import type { AnswerPolicy } from '../../answers/policy.ts';
import { answersReply } from '../../present/answerReply.ts';
import {
  type AgainInWords,
  againReply,
  differReply,
  type RecordInWords,
} from '../../present/compose/again.ts';
import type { Reply } from '../../present/reply.ts';
import type { PriceSeries, PriceSnapshot } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { fromRecord, jobOf, type RecordBody } from './body.ts';
import { changesThePast, dataChange, upToLastKept } from './dataChanges.ts';
import { figureDifferences } from './differences.ts';
import type { OnRecord } from './ports.ts';
import { traitsOf } from './traits.ts';

/** What it takes to work an answer out again. */
export type Recomputing = {
  readonly compute: (job: AnswerJob) => Promise<Result<Answers>>;
  readonly snapshot: Result<PriceSnapshot>;
  readonly policy: AnswerPolicy;
  readonly nodeVersion: string;
  readonly timeZone: string;
};

const headlineOf = (answers: Answers): string => answersReply(answers).sentence;

const inWords = ({ answer, askings }: OnRecord, { answers }: RecordBody): RecordInWords => {
  const [first] = askings;
  return {
    id: answer.ids[0],
    question: answer.question,
    asOf: answer.asOf,
    methodVersion: answer.methodVersion,
    firstAskedAtMs: first?.askedAtMs ?? 0,
    askedTimes: askings.length,
    nodeVersion: first?.versions.node ?? 'unknown',
    headline: headlineOf(answers),
  };
};

type FromItsOwn = Pick<AgainInWords, 'refused' | 'same' | 'sameWords' | 'differences'>;

/** The answer from the very prices that were kept with it. */
const fromItsOwnPrices = async (
  { compute }: Recomputing,
  { answer }: OnRecord,
  body: RecordBody,
): Promise<FromItsOwn> => {
  const outcome = await compute(jobOf(answer, body));
  if (!outcome.ok)
    return { refused: outcome.problem.message, same: false, sameWords: false, differences: [] };
  const differences = figureDifferences(body.answers, outcome.value);
  const sameWords = contentOf({ policy: body.policy, answers: outcome.value }) === answer.content;
  return { refused: null, same: differences.length === 0, sameWords, differences };
};

type OnToday = Pick<AgainInWords, 'changes' | 'restated' | 'today'>;

type Pair = { readonly kept: PriceSeries; readonly today: PriceSeries };

const pairsOf = (kept: readonly PriceSeries[], snapshot: PriceSnapshot): readonly Pair[] =>
  kept.flatMap((series) => {
    const today = snapshot.series(series.ticker);
    return today === null ? [] : [{ kept: series, today }];
  });

const missingFrom = (kept: readonly PriceSeries[], snapshot: PriceSnapshot): readonly string[] =>
  kept.flatMap(({ ticker }) =>
    snapshot.series(ticker) === null ? [`${ticker} is not in the prices of today.`] : [],
  );

const headlineFor = async (recomputing: Recomputing, job: AnswerJob): Promise<string> => {
  const outcome = await recomputing.compute({ ...job, policy: recomputing.policy });
  if (!outcome.ok) return outcome.problem.message;
  return `${headlineOf(outcome.value)} (${outcome.value[0].id})`;
};

/** The same question on the prices of today, and what became of the prices in between. */
const onToday = async (
  recomputing: Recomputing,
  { answer }: OnRecord,
  body: RecordBody,
): Promise<OnToday> => {
  const { snapshot } = recomputing;
  if (!snapshot.ok)
    return { changes: [snapshot.problem.message], restated: null, today: 'There are no prices of today.' };
  const missing = missingFrom(answer.series, snapshot.value);
  if (missing.length > 0)
    return {
      changes: missing,
      restated: null,
      today: 'The question cannot be asked of the prices of today.',
    };
  const pairs = pairsOf(answer.series, snapshot.value);
  const changes = pairs.map(({ kept, today }) => dataChange(kept, today));
  const job = jobOf(answer, body);
  const sameDays = { ...job, series: pairs.map(({ kept, today }) => upToLastKept(kept, today)) };
  return {
    changes,
    restated: changes.some(changesThePast) ? await headlineFor(recomputing, sameDays) : null,
    today: await headlineFor(recomputing, { ...job, series: pairs.map(({ today }) => today) }),
  };
};

/** Works one answer out again, from its own prices and on those of today. */
export const againOne = async (recomputing: Recomputing, record: OnRecord): Promise<Result<Reply>> => {
  const body = fromRecord(record.answer);
  if (!body.ok) return body;
  const again: AgainInWords = {
    record: inWords(record, body.value),
    ...(await fromItsOwnPrices(recomputing, record, body.value)),
    ...(await onToday(recomputing, record, body.value)),
    methodVersionNow: methodVersion,
    nodeVersionNow: recomputing.nodeVersion,
  };
  return succeed(againReply(again, recomputing.timeZone));
};

const none = 'none';

/** Says what two answers differ in, and what each says. */
export const againTwo = (first: OnRecord, second: OnRecord): Result<Reply> => {
  const [one, other] = [fromRecord(first.answer), fromRecord(second.answer)];
  if (!one.ok) return one;
  if (!other.ok) return other;
  const others = new Map(traitsOf(other.value).map(({ name, value }) => [name, value]));
  const differing = traitsOf(one.value).flatMap(({ name, value }) => {
    const against = others.get(name) ?? null;
    return against === value ? [] : [{ name, first: value ?? none, second: against ?? none }];
  });
  return succeed(differReply(inWords(first, one.value), inWords(second, other.value), differing));
};
