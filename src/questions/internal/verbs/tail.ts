import { levelText } from '../../../terms/level.ts';
import { limits } from '../../limits.ts';
import type { TailQuestion } from '../../question.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { firstOf } from '../pieces/piece.ts';
import { settleLevels } from './settle.ts';
import { takeTailLevel } from './tailLevel.ts';
import { createTaking, type Taking, takeSample } from './taking.ts';
import { faultAtPiece, ofEachTicker, type ReadLine, type VerbLine, type VerbReader } from './verbReader.ts';

type TailFigures = Pick<TailQuestion, 'tailLevel' | 'horizonDays'>;

const takeFigures = (taking: Taking, line: VerbLine): Attempt<TailFigures> => {
  const { level, horizonDays } = line.context.defaults.tail;
  const tailLevel = takeTailLevel(taking, line, level);
  if (!tailLevel.ok) return tailLevel;
  const asked = firstOf(line.pieces, 'horizon')?.days ?? null;
  const horizon = taking.orDefault(asked, horizonDays, `over ${horizonDays}d`);
  return attained({ tailLevel: tailLevel.value, horizonDays: horizon });
};

/** How rare a daily loss is has neither a level nor a horizon: both stay at what they would be, unsaid. */
const figuresBeyond = (line: VerbLine): Attempt<TailFigures> => {
  const unwanted = line.pieces.find(({ piece }) => piece.kind === 'level' || piece.kind === 'horizon');
  if (unwanted === undefined)
    return attained({ tailLevel: line.context.defaults.tail.level, horizonDays: 1 });
  const says = 'does not go with beyond, which asks how rare a daily loss is. Leave one of the two out.';
  return faulty(faultAtPiece(line, unwanted, { code: 'notForVerb', says, instead: [''] }));
};

const read = (line: VerbLine): Attempt<ReadLine> => {
  const { pieces, context } = line;
  const taking = createTaking();
  const sample = takeSample(taking, pieces, context.defaults.tail.window);
  const beyond = firstOf(pieces, 'beyond')?.fraction ?? null;
  const figures = beyond === null ? takeFigures(taking, line) : figuresBeyond(line);
  if (!figures.ok) return figures;
  const { confidence } = context.defaults.tail;
  const asked = firstOf(pieces, 'confidence')?.level ?? null;
  const question: Omit<TailQuestion, 'ticker'> = {
    verb: 'tail',
    ...sample,
    ...figures.value,
    confidence: taking.orDefault(asked, confidence, `confidence ${levelText(confidence)}`),
    exposure: firstOf(pieces, 'exposure')?.exposure ?? null,
    model: firstOf(pieces, 'model')?.model ?? null,
    beyond,
  };
  return attained(ofEachTicker(line, taking.assumed, (ticker) => ({ ...question, ticker })));
};

export const tail: VerbReader = {
  verb: 'tail',
  takes: new Set([
    'ticker',
    'window',
    'level',
    'confidence',
    'horizon',
    'exposure',
    'model',
    'beyond',
    'log',
    'wish',
  ]),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle: settleLevels,
  read,
};
