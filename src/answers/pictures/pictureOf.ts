import type { BacktestQuestion, TailQuestion } from '../../questions/question.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { Answers, BacktestAnswer, TailAnswer, TailBeyondAnswer } from '../answer.ts';
import type { AnswerJob } from '../answerQuestion.ts';
import type { JudgedModel } from '../backtest/figures.ts';
import { sampleReturns } from '../sample.ts';
import { leadingOf, returnsOfPosition } from '../tail/models.ts';
import { backtestPath } from './backtestPath.ts';
import { needWidths } from './needWidths.ts';
import type { PictureData } from './pictureData.ts';
import { quantilePoints } from './quantilePoints.ts';
import { returnPicture } from './returnPicture.ts';

/** What only a bug could bring: answers that are not the outcome of the job beside them. */
const mismatched = (kind: string): never => {
  throw new Error(`pictureOf: an answer of the kind ${kind} without its question`);
};

const tailFigures = (answer: TailAnswer | TailBeyondAnswer): readonly number[] =>
  answer.kind === 'tail'
    ? answer.figures.models.flatMap((each) =>
        each.ok ? [each.var, ...(each.es === null ? [] : [each.es])] : [],
      )
    : [answer.figures.threshold];

const ofTail = (
  answer: TailAnswer | TailBeyondAnswer,
  question: TailQuestion,
  series: PriceSeries,
): Result<PictureData> => {
  const sample = sampleReturns(series, question);
  if (!sample.ok) return sample;
  const { position } = answer.figures;
  const seen = returnsOfPosition(sample.value.returns, { position, amount: null });
  const returns = returnPicture(seen, tailFigures(answer));
  return succeed(
    answer.kind === 'tail' ? { kind: 'tail', answer, returns } : { kind: 'beyond', answer, returns },
  );
};

const ofBacktest = (
  answer: BacktestAnswer,
  question: BacktestQuestion,
  series: PriceSeries,
): Result<PictureData> => {
  const leading = leadingOf<JudgedModel>(answer.figures.models);
  if (leading === null) return mismatched(answer.kind);
  const path = backtestPath(question, series, leading.model);
  return path.ok ? succeed({ kind: 'backtest', answer, path: path.value }) : path;
};

/** What the picture of these answers shows, from the job that they are the outcome of. Pure. */
export const pictureOf = ({ read, series }: AnswerJob, answers: Answers): Result<PictureData> => {
  const [answer] = answers;
  const [first] = series;
  const { question } = read;
  if (first === undefined) return mismatched(answer.kind);
  switch (answer.kind) {
    case 'tail':
    case 'tail beyond':
      return question.verb === 'tail' ? ofTail(answer, question, first) : mismatched(answer.kind);
    case 'backtest':
      return question.verb === 'backtest' ? ofBacktest(answer, question, first) : mismatched(answer.kind);
    case 'shape': {
      if (question.verb !== 'shape') return mismatched(answer.kind);
      const sample = sampleReturns(first, question);
      return sample.ok
        ? succeed({ kind: 'shape', answer, points: quantilePoints(sample.value.returns) })
        : sample;
    }
    case 'need':
      return question.verb === 'need'
        ? succeed({ kind: 'need', answer, widths: needWidths(answer.figures, question.level) })
        : mismatched(answer.kind);
    default:
      return succeed({ kind: 'figures', answers, answer });
  }
};
