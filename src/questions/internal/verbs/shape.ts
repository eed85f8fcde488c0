import { levelText } from '../../../terms/level.ts';
import { limits } from '../../limits.ts';
import { attained, faulty } from '../faults/fault.ts';
import { allOf } from '../pieces/piece.ts';
import { settleLevels } from './settle.ts';
import { createTaking, takeSample } from './taking.ts';
import { faultAtPiece, ofEachTicker, type VerbReader } from './verbReader.ts';

export const shape: VerbReader = {
  verb: 'shape',
  takes: new Set(['ticker', 'window', 'level', 'confidence', 'log', 'wish']),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle: settleLevels,
  read: (line) => {
    const { pieces, context } = line;
    // shape has one level only, so `at 90%` and `confidence 90%` are the same
    const [asked, again] = [...allOf(pieces, 'level'), ...allOf(pieces, 'confidence')];
    if (again !== undefined) {
      const says = 'is a second level, and shape has one. Leave one out.';
      return faulty(faultAtPiece(line, again, { code: 'repeated', says, instead: [''] }));
    }
    const taking = createTaking();
    const fallback = context.defaults.shape.confidence;
    const sample = takeSample(taking, pieces, context.defaults.shape.window);
    const confidence = taking.orDefault(
      asked?.piece.level ?? null,
      fallback,
      `confidence ${levelText(fallback)}`,
    );
    return attained(
      ofEachTicker(line, taking.assumed, (ticker) => ({ verb: 'shape', ticker, ...sample, confidence })),
    );
  },
};
