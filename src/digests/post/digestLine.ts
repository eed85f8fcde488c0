import type { Answer, Answers, BacktestAnswer, TailAnswer } from '../../answers/answer.ts';
import type { JudgedModel } from '../../answers/backtest/figures.ts';
import type { TailModelFigures } from '../../answers/tail/figures.ts';
import { type Day, dayFromIso } from '../../terms/day.ts';
import type { Result } from '../../terms/result.ts';
import type { DigestFigures, DigestLine } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import { backtestOf, type DigestBody, tailOf } from '../body.ts';
import type { PricesNow } from '../ports.ts';

const isTail = (answer: Answer): answer is TailAnswer => answer.kind === 'tail';
const isBacktest = (answer: Answer): answer is BacktestAnswer => answer.kind === 'backtest';

const dayOf = (iso: string): Day => {
  const day = dayFromIso(iso);
  if (day === null) throw new RangeError(`digest: ${iso} is no day`);
  return day;
};

/** The answer with its model’s figures, or why there are none. */
const tailIn = (answers: Result<Answers>): { answer: TailAnswer; figures: TailModelFigures } | string => {
  if (!answers.ok) return answers.problem.message;
  const answer = answers.value.find(isTail);
  if (answer === undefined) throw new Error('digest: a tail question had another answer');
  const figures = answer.figures.models.find((each): each is TailModelFigures => each.ok);
  if (figures !== undefined) return { answer, figures };
  const refused = answer.figures.models.find((each) => !each.ok);
  return refused?.ok === false ? refused.problem.message : 'no figure can be given';
};

const backtestIn = (answers: Result<Answers>): { answer: BacktestAnswer; judged: JudgedModel } | string => {
  if (!answers.ok) return answers.problem.message;
  const answer = answers.value.find(isBacktest);
  if (answer === undefined) throw new Error('digest: a backtest question had another answer');
  const judged = answer.figures.models.find((each): each is JudgedModel => each.ok);
  if (judged !== undefined) return { answer, judged };
  const refused = answer.figures.models.find((each) => !each.ok);
  return refused?.ok === false ? refused.problem.message : 'no day can be judged';
};

type Change = Pick<DigestFigures, 'change' | 'changeOverHalfWidth'>;

const changeOf = ({ var: now, varLower, varUpper }: TailModelFigures, before: number | undefined): Change => {
  if (before === undefined) return { change: null, changeOverHalfWidth: null };
  const change = now - before;
  const halfWidth = varLower === null || varUpper === null ? null : (varUpper - varLower) / 2;
  return {
    change,
    changeOverHalfWidth: halfWidth === null || halfWidth === 0 ? null : change / halfWidth,
  };
};

type Judged = Pick<DigestFigures, 'exceeded' | 'judged' | 'notJudged' | 'backtestId'>;

/** Whether the last day was exceeded is taken from the judged days, whose figures never contain the day. */
const judgedOf = (backtest: ReturnType<typeof backtestIn>, asOf: string): Judged => {
  if (typeof backtest === 'string')
    return { exceeded: null, judged: null, notJudged: backtest, backtestId: null };
  const { answer, judged } = backtest;
  return {
    exceeded: answer.asOf === asOf ? judged.exceedanceDates.includes(asOf) : null,
    judged: { days: judged.days, exceedances: judged.exceedances, zone: judged.zone },
    notJudged: null,
    backtestId: answer.id,
  };
};

/** The line of one ticker, from two answers that are kept on record. */
export const digestLine = async (
  prices: PricesNow,
  body: DigestBody,
  ticker: string,
  varBefore: number | undefined,
  by: Subscription,
): Promise<DigestLine> => {
  const [tailAnswers, backtestAnswers] = await Promise.all([
    prices.ask(tailOf(body, ticker), by),
    prices.ask(backtestOf(body, ticker), by),
  ]);
  const tail = tailIn(tailAnswers);
  if (typeof tail === 'string') return { ok: false, ticker, message: tail };
  const { answer, figures } = tail;
  const lastReturn = prices.returnsAfter(ticker, null, 'simple').at(-1);
  if (lastReturn === undefined) return { ok: false, ticker, message: `${ticker} has no return yet.` };
  return {
    ok: true,
    ticker,
    asOf: dayOf(answer.asOf),
    lastReturn: lastReturn.value,
    var: figures.var,
    varLower: figures.varLower,
    varUpper: figures.varUpper,
    es: figures.es,
    esLower: figures.esLower,
    esUpper: figures.esUpper,
    ...changeOf(figures, varBefore),
    ...judgedOf(backtestIn(backtestAnswers), answer.asOf),
    tailId: answer.id,
    warnings: answer.warnings.map(({ text }) => text),
  };
};
