import type { Question, RecordQuestion, StatisticalQuestion } from '../questions/question.ts';

export const isOfRecords = (question: Question): question is RecordQuestion =>
  question.verb === 'again' || question.verb === 'records';

export const isStatistical = (question: Question): question is StatisticalQuestion =>
  question.verb !== 'help' && question.verb !== 'feed' && !isOfRecords(question);
