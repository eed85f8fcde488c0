import type { BacktestQuestion } from '../../questions/question.ts';
import { isoFromDay } from '../../terms/day.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { windowText } from '../../terms/window.ts';
import { counted } from '../../wording/words.ts';
import { type ReturnSample, sampleReturns } from '../sample.ts';

/** The days that are judged, and the returns behind the first of them. */
export type Judged = {
  readonly whole: ReturnSample;
  readonly firstDay: number;
  readonly dayCount: number;
  readonly cut: boolean;
};

const tooShort = (whole: ReturnSample, question: BacktestQuestion) => {
  const count = whole.returns.length;
  const room = Math.max(0, count - question.estimationReturns);
  return refuse(
    problem(
      'windowTooLong',
      `${whole.ticker} has ${counted(count, 'return')}; with ${question.estimationReturns} behind each day’s figure ${counted(room, 'day')} can be judged, and ${windowText(question.window)} reaches back further. Ask for fewer days, or for a shorter window with on window.`,
      { needs: question.estimationReturns + 2 },
    ),
  );
};

const daysAfter = ({ days }: ReturnSample, { to }: ReturnSample): number =>
  days.reduce((count, day) => count + (day > to ? 1 : 0), 0);

/** The days that a question is about. A default window is cut to what can be judged; an asked one is refused. */
export const judgedDays = (series: PriceSeries, question: BacktestQuestion): Result<Judged> => {
  const { returnType, estimationReturns, windowAsked } = question;
  const whole = sampleReturns(series, { window: { kind: 'all' }, windowAsked: false, returnType });
  if (!whole.ok) return whole;
  const asked = sampleReturns(series, question);
  if (!asked.ok) return asked;
  const last =
    whole.value.returns.length -
    (whole.value.to === asked.value.to ? 0 : daysAfter(whole.value, asked.value));
  const first = last - asked.value.returns.length;
  if (first >= estimationReturns)
    return succeed({ whole: whole.value, firstDay: first, dayCount: last - first, cut: false });
  if (windowAsked || last - estimationReturns < 2) return tooShort(whole.value, question);
  return succeed({
    whole: whole.value,
    firstDay: estimationReturns,
    dayCount: last - estimationReturns,
    cut: true,
  });
};

export const dateOf = ({ whole }: Judged, place: number): string =>
  isoFromDay(whole.days[place + 1] as number);
