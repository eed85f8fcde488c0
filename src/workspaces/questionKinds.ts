import type {
  PinQuestion,
  Question,
  RecordQuestion,
  StatisticalQuestion,
  SubscriptionQuestion,
} from '../questions/question.ts';

export const isOfRecords = (question: Question): question is RecordQuestion =>
  question.verb === 'again' || question.verb === 'records';

export const isOfSubscriptions = (question: Question): question is SubscriptionQuestion =>
  question.verb === 'digest' || question.verb === 'watch';

export const isOfPins = (question: Question): question is PinQuestion =>
  question.verb === 'pin' || question.verb === 'unpin';

export const isStatistical = (question: Question): question is StatisticalQuestion =>
  question.verb !== 'help' &&
  question.verb !== 'feed' &&
  !isOfRecords(question) &&
  !isOfSubscriptions(question) &&
  !isOfPins(question);
