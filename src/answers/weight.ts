import type { IntervalQuestion } from '../questions/question.ts';
import { dependenceFoundBelow, volatilityClustering } from '../stats/dependence/clustering.ts';
import { meanEvidence } from '../stats/mean/evidence.ts';
import type { PriceSeries } from '../terms/prices.ts';
import type { AnswerJob } from './answerQuestion.ts';
import { sampleReturns } from './sample.ts';

/** An interval is heavy exactly where its rules call for resampling. */
const resamples = (question: IntervalQuestion, series: PriceSeries): boolean => {
  if (question.of === 'ratio') return false;
  if (question.robust) return true;
  const sample = sampleReturns(series, question);
  if (!sample.ok) return false;
  const { returns } = sample.value;
  if (question.of === 'vol') return volatilityClustering(returns).p < dependenceFoundBelow;
  const { dependent, lopsided } = meanEvidence(returns);
  return dependent || lopsided;
};

/** Will this answer take long enough that others should not wait for it? Decided from the rules, not by trying. */
export const isHeavy = ({ read, series }: Pick<AnswerJob, 'read' | 'series'>): boolean => {
  const { question } = read;
  const [first] = series;
  if (question.verb === 'interval') return first !== undefined && resamples(question, first);
  return ['compare', 'tail', 'shape', 'backtest'].includes(question.verb);
};
