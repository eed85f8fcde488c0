import type { Answer, TailAnswer } from '../../answers/answer.ts';
import type { TailModelFigures } from '../../answers/tail/figures.ts';
import { type Day, dayFromIso } from '../../terms/day.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { WatchEvent, WatchReading } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import type { WatchBody } from '../body.ts';
import type { WatchMemory } from '../memory.ts';
import type { PricesNow } from '../ports.ts';
import { isBeyond, nextStand } from './crossing.ts';

/** The tail figure of a day, from an answer on record. */
export type Figure = {
  readonly day: Day;
  readonly value: number;
  readonly lower: number | null;
  readonly upper: number | null;
  readonly answerId: string;
};

const isTail = (answer: Answer): answer is TailAnswer => answer.kind === 'tail';

const measureOf = (figures: TailModelFigures, of: 'var' | 'es'): Omit<Figure, 'day' | 'answerId'> | null => {
  if (of === 'var') return { value: figures.var, lower: figures.varLower, upper: figures.varUpper };
  return figures.es === null ? null : { value: figures.es, lower: figures.esLower, upper: figures.esUpper };
};

const noFigure = (message: string) => refuse(problem('notEnoughTail', message));

/** What the watched figure is today. */
export const figureOf = async (
  prices: PricesNow,
  body: WatchBody,
  by: Subscription,
): Promise<Result<Figure>> => {
  const answers = await prices.ask(body.tail, by);
  if (!answers.ok) return answers;
  const answer = answers.value.find(isTail);
  const day = answer === undefined ? null : dayFromIso(answer.asOf);
  if (answer === undefined || day === null) throw new Error('watch: a tail question had another answer');
  const [model] = answer.figures.models;
  if (model === undefined || !model.ok) return noFigure(model?.problem.message ?? 'no figure can be given');
  const value = measureOf(model, body.watched === 'es' ? 'es' : 'var');
  return value === null
    ? noFigure('the tail is so heavy that its ES does not exist')
    : succeed({ ...value, day, answerId: answer.id });
};

/** What a watch found on a new session: what it remembers from now on, and what it says, if anything. */
export type WatchStep = {
  readonly memory: WatchMemory;
  readonly event: WatchEvent | null;
  readonly reading: WatchReading | null;
};

/** Of a figure against the line that was drawn for it. */
const figureStep = (body: WatchBody, memory: WatchMemory, figure: Figure): WatchStep => {
  const { crossing } = body;
  if (crossing === null) throw new Error('watch: a figure without a line');
  const { stand, event } = nextStand(memory, isBeyond(figure.value, crossing.fraction, crossing.side));
  const { value, lower, upper, day, answerId } = figure;
  return {
    memory: { ...memory, ...stand },
    event,
    reading: {
      of: body.watched,
      day,
      value,
      lower,
      upper,
      line: crossing.fraction,
      side: crossing.side,
      lineDay: null,
      answerId,
    },
  };
};

/**
 * Of the losses since the session before against the figure that was stored then: never one that contains the day. Where
 * several sessions came at once, each is held against that figure, and the last that passed it is told.
 */
const lossStep = (body: WatchBody, memory: WatchMemory, prices: PricesNow): WatchStep => {
  const { figure } = memory;
  if (figure === null) return { memory, event: null, reading: null };
  const { ticker, returnType } = body.tail;
  const worse = prices
    .returnsAfter(ticker, figure.day, returnType)
    .filter(({ value }) => -value > figure.value)
    .at(-1);
  if (worse === undefined) return { memory, event: null, reading: null };
  return {
    memory,
    event: 'fired',
    reading: {
      of: 'loss',
      day: worse.day,
      value: -worse.value,
      lower: null,
      upper: null,
      line: figure.value,
      side: 'above',
      lineDay: figure.day,
      answerId: figure.answerId,
    },
  };
};

/** One new session of a watch. `figure` is what the tail is now, the session included. */
export const watchStep = (
  body: WatchBody,
  memory: WatchMemory,
  prices: PricesNow,
  figure: Figure,
): WatchStep => {
  const step = body.watched === 'loss' ? lossStep(body, memory, prices) : figureStep(body, memory, figure);
  const { day, value, answerId } = figure;
  return {
    ...step,
    memory: { ...step.memory, lastDay: day, figure: { day, value, answerId }, saidCannotTell: false },
  };
};
