import { levelText } from '../../terms/level.ts';
import { type Problem, problem } from '../../terms/problem.ts';
import type { RandomStreams } from '../../terms/random.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import type { TailModelName } from '../tails/tailFigures.ts';
import { judgeModel, type ModelVerdict } from './judgedModel.ts';
import { type Standing, standings } from './league.ts';
import type { RollingSpan } from './rolling/rollingForecaster.ts';
import type { DrawBeyond } from './shortfall.ts';
import { chosenDays, type Walk, type WalkedModel, type WalkListener, walk } from './walk.ts';

export type BacktestQuestion = RollingSpan & {
  readonly models: readonly TailModelName[];
  readonly streams: RandomStreams;
  /** Replicates of the simulated ES test; 9,999 unless said. */
  readonly replicates?: number;
  readonly listener?: WalkListener;
};

export type ModelRefused = {
  readonly model: TailModelName;
  readonly ok: false;
  readonly problem: Problem;
};

export type Backtest = {
  readonly models: readonly (ModelVerdict | ModelRefused)[];
  /** Days on which every model that was not refused gave a figure: those over which they are ranked. */
  readonly commonDays: number;
};

/** A model without a figure on more than this share of the days is refused: the days it skips are not the calm ones. */
const mostRefusedShare = 0.1;
const defaultReplicates = 9_999;

const refuseQuestion = (question: BacktestQuestion): Refusal | null => {
  const { returns, firstDay, dayCount, estimationReturns, tailLevel } = question;
  if (2 * tailLevel.digits <= 10 ** tailLevel.places) {
    const message = `A backtest at ${levelText(tailLevel)} judges no tail. Ask for a level above 50%, such as 99%.`;
    return refuse(problem('levelOutside', message));
  }
  if (dayCount < 2) {
    const message = `A backtest needs at least 2 days to judge, and there ${dayCount === 1 ? 'is 1' : 'are none'}. Ask for more days.`;
    return refuse(problem('tooFewReturns', message, { needs: 2 }));
  }
  if (firstDay < estimationReturns) {
    const message = `The first day judged needs ${estimationReturns} returns before it, and there are ${firstDay}. Ask for ${estimationReturns - firstDay} days fewer, or for a shorter estimation window.`;
    return refuse(problem('tooFewReturns', message, { needs: estimationReturns }));
  }
  if (firstDay + dayCount > returns.length)
    throw new RangeError(`backtest: days up to ${firstDay + dayCount} of ${returns.length} returns`);
  return null;
};

/** Refuses a model that left out too many days, in the words of its first refusal. */
const withoutGaps = ({ model, outcome }: Walk, dayCount: number): Walk => {
  if (!outcome.ok) return { model, outcome };
  const { refusedDays, firstRefusal } = outcome.value;
  if (firstRefusal === null || refusedDays <= mostRefusedShare * dayCount) return { model, outcome };
  const message = `The model gave no figure on ${refusedDays} of ${dayCount} days, which is too many to judge it. On the first of them: ${firstRefusal.message}`;
  return { model, outcome: refuse({ ...firstRefusal, message }) };
};

const verdictOn = (
  walked: WalkedModel,
  question: BacktestQuestion,
  standing: Standing | null,
): ModelVerdict => {
  const { tailLevel, streams, replicates = defaultReplicates } = question;
  const { forecaster, figured, refusedDays, firstRefusal } = walked;
  const forecasts = chosenDays(walked, question, (place) => figured[place] === 1);
  const drawBeyond: DrawBeyond = (place, random) =>
    forecaster.drawBeyond(forecasts.days[place] as number, random);
  return {
    model: forecaster.model,
    ok: true,
    ...judgeModel(forecasts, tailLevel, drawBeyond, streams, replicates),
    standing,
    refusedDays,
    firstRefusal,
  };
};

/** Each model's place over the days that all of them share, in the order of the models; empty where they share none. */
const standingsOf = (walked: readonly WalkedModel[], question: BacktestQuestion) => {
  const shared = (place: number) => walked.every(({ figured }) => figured[place] === 1);
  const days = walked.map((one) => chosenDays(one, question, shared));
  const commonDays = days[0]?.days.length ?? 0;
  return { commonDays, standing: commonDays === 0 ? [] : standings(days, question.tailLevel) };
};

/**
 * Did the tail figures hold up, had they been made day by day?
 *
 * Convention: each day's VaR and ES come from the `estimationReturns` returns before it; an exceedance is a loss strictly
 * larger than the VaR. Student, normal, historical and peaks are estimated daily; GARCH parameters every 20 days, with the
 * variance updated daily. Every model is judged over the days on which it gave a figure, and ranked over the days that all
 * models share.
 * Domain: finite returns in time order, a tail level above 50%, at least 2 days, `estimationReturns` returns before the
 * first; refused otherwise. Each model refuses a window that is too short for it; a refused model takes nothing from the others.
 * Units: returns as decimal fractions in; counts, days as indices into the returns, ratios and probabilities out.
 * Edges: a model without a figure on more than a tenth of the days is refused in the words of its first refusal; fewer such
 * days are left out and counted. Null where the listener ended the walk.
 * Source: the tests' own; see coverageTest, independenceTest, exactIndependenceP, trafficLight, shortfallZ2 and standings.
 * Example: backtest({ returns, firstDay: 250, dayCount: 500, estimationReturns: 250, tailLevel, models, streams }).
 */
export const backtest = (question: BacktestQuestion): Result<Backtest> | null => {
  const refusal = refuseQuestion(question);
  if (refusal !== null) return refusal;
  const { models, dayCount, listener = {} } = question;
  const started = walk(models, question, listener);
  if (started === null) return null;
  const walks = started.map((one) => withoutGaps(one, dayCount));
  const walked = walks.flatMap(({ outcome }) => (outcome.ok ? [outcome.value] : []));
  const { commonDays, standing } = standingsOf(walked, question);
  const verdicts: (ModelVerdict | ModelRefused)[] = [];
  for (const { model, outcome } of walks) {
    if (listener.cancelled?.() === true) return null;
    verdicts.push(
      outcome.ok
        ? verdictOn(outcome.value, question, standing[walked.indexOf(outcome.value)] ?? null)
        : { model, ok: false, problem: outcome.problem },
    );
  }
  return succeed({ models: verdicts, commonDays });
};
