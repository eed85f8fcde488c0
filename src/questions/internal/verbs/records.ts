import type { Day } from '../../../terms/day.ts';
import { limits } from '../../limits.ts';
import type { RecordsQuestion } from '../../question.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf, has } from '../pieces/piece.ts';
import { found, type Recogniser } from '../recognisers/recogniser.ts';
import { settleLevels } from './settle.ts';
import { faultAtPiece, type VerbLine, type VerbReader } from './verbReader.ts';

const verify: Recogniser = (line, at) => {
  const word = line.words[at];
  return word?.lower === 'verify' && !word.quoted ? found({ kind: 'verify' }, 1) : null;
};

/** Records are asked for from a day on; other windows are about returns. */
const sinceOf = (line: VerbLine): Attempt<Day | null> => {
  const [window] = allOf(line.pieces, 'window');
  if (window === undefined) return attained(null);
  if (window.piece.window.kind === 'since') return attained(window.piece.window.day);
  const says = 'does not go with records. Write since and a day, such as since 2026-05-04.';
  return faulty(faultAtPiece(line, window, { code: 'notForVerb', says, instead: [''] }));
};

/** All records are examined, or none: the chain that vouches for them is one. */
const examined = (line: VerbLine): Attempt<readonly RecordsQuestion[]> => {
  const [other] = line.pieces.filter(({ piece }) => piece.kind === 'ticker' || piece.kind === 'window');
  if (other === undefined) return attained([{ verb: 'records', ticker: null, since: null, verify: true }]);
  const says = 'does not go with verify, which examines all records. Leave it out.';
  return faulty(faultAtPiece(line, other, { code: 'notForVerb', says, instead: [''] }));
};

const listed = (line: VerbLine): Attempt<readonly RecordsQuestion[]> => {
  const since = sinceOf(line);
  if (!since.ok) return since;
  const asked: readonly (string | null)[] = line.tickers.length === 0 ? [null] : line.tickers;
  return attained(asked.map((ticker) => ({ verb: 'records', ticker, since: since.value, verify: false })));
};

export const records: VerbReader = {
  verb: 'records',
  takes: new Set(['ticker', 'window', 'verify']),
  tickers: { least: 0, most: limits.tickersPerQuestion },
  recognise: verify,
  settle: settleLevels,
  read: (line) => {
    const questions = has(line.pieces, 'verify') ? examined(line) : listed(line);
    return questions.ok ? attained({ questions: questions.value, assumed: [] }) : questions;
  },
};
