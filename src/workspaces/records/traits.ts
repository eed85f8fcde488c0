import type { StatisticalQuestion } from '../../questions/question.ts';
import { levelText } from '../../terms/level.ts';
import type { RecordBody } from './body.ts';

/** What two answers can differ in, each as it is said; null where an answer has no such thing. */
export type Trait = { readonly name: string; readonly value: string | null };

const levelOf = (question: StatisticalQuestion): string => {
  if ('tailLevel' in question) return levelText(question.tailLevel);
  return levelText('level' in question ? question.level : question.confidence);
};

const modelOf = (question: StatisticalQuestion): string | null =>
  'model' in question ? (question.model ?? 'all models') : null;

const shownFingerprint = 12;

export const traitsOf = ({ question, answers: [first] }: RecordBody): readonly Trait[] => [
  { name: 'Verb', value: first.verb },
  { name: 'Ticker', value: first.subject.join(' ') },
  { name: 'Window', value: first.window.asked },
  { name: 'Level', value: levelOf(question) },
  { name: 'Return type', value: first.returnType },
  { name: 'Adjustment', value: first.priceAdjustment },
  { name: 'Model', value: modelOf(question) },
  { name: 'Data date', value: first.asOf },
  { name: 'Method version', value: first.methodVersion },
  { name: 'Prices used', value: first.dataFingerprint.slice(0, shownFingerprint) },
];
