import { levelText } from '../../../terms/level.ts';
import { limits } from '../../limits.ts';
import type { TailQuestion, WatchQuestion } from '../../question.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf, firstOf, type PieceKind, type PieceOf, type Placed } from '../pieces/piece.ts';
import { faultAt, foundFault, type Recogniser } from '../recognisers/recogniser.ts';
import { doing, doingWords } from '../recognisers/schedule/doings.ts';
import { languageWords } from '../recognisers/table.ts';
import { crossing, watched } from '../recognisers/watched.ts';
import { settleLevels } from './settle.ts';
import { idOf, nothingToDo, onlyThese } from './subscriptionId.ts';
import { takeTailLevel } from './tailLevel.ts';
import { createTaking, type Taking, takeSample } from './taking.ts';
import {
  faultAtPiece,
  missing,
  ofEachTicker,
  type ReadLine,
  type VerbLine,
  type VerbReader,
} from './verbReader.ts';
import { verbOfWord } from './verbWords.ts';

const named = { noun: 'watch', letter: 'W' } as const;

const whatIsWatched = 'What can be watched: tail (VaR), ES, loss beyond tail.';

/** Another verb asks for something that cannot be watched. */
const otherVerb: Recogniser = (line, at) => {
  const word = line.words[at];
  const verb = word === undefined || word.quoted ? null : verbOfWord(word.lower);
  if (verb === null || verb === 'watch' || verb === 'tail') return null;
  const says = `cannot be watched. ${whatIsWatched}`;
  return foundFault(faultAt(line, at, 1, { code: 'notForVerb', says, instead: ['tail'] }), 1);
};

const recognise: Recogniser = (line, at) =>
  doing(line, at) ?? watched(line, at) ?? crossing(line, at) ?? otherVerb(line, at);

type Watched = PieceOf<'watched'>['watched'];

/** The tail question behind a watch, but for its ticker. */
const takeTail = (taking: Taking, line: VerbLine): Attempt<Omit<TailQuestion, 'ticker'>> => {
  const { pieces, context } = line;
  const { window, level, model } = context.defaults.digest;
  const { confidence } = context.defaults.tail;
  const sample = takeSample(taking, pieces, window);
  const tailLevel = takeTailLevel(taking, line, level);
  if (!tailLevel.ok) return tailLevel;
  const asked = firstOf(pieces, 'confidence')?.level ?? null;
  return attained({
    verb: 'tail',
    ...sample,
    tailLevel: tailLevel.value,
    confidence: taking.orDefault(asked, confidence, `confidence ${levelText(confidence)}`),
    horizonDays: firstOf(pieces, 'horizon')?.days ?? 1,
    exposure: null,
    model: taking.orDefault(firstOf(pieces, 'model')?.model ?? null, model, `by ${model}`),
    beyond: null,
  });
};

/** A loss is of one day and is held against the figure itself; a figure needs the line that it crosses. */
const mismatch = (line: VerbLine, of: Watched): Attempt<null> => {
  const [unwanted] = [...allOf(line.pieces, 'crossing'), ...allOf(line.pieces, 'horizon')].filter(
    ({ piece }) => of === 'loss' && (piece.kind === 'crossing' || piece.kind === 'horizon'),
  );
  if (unwanted !== undefined) return faulty(besideLoss(line, unwanted));
  if (of === 'loss' || firstOf(line.pieces, 'crossing') !== null) return attained(null);
  const message = 'The line to watch is missing. Add one, such as above 4% or below 2%.';
  return faulty(missing(line, message, ['above 4%']));
};

const besideLoss = (line: VerbLine, placed: Placed) =>
  faultAtPiece(line, placed, {
    code: 'notForVerb',
    says: 'does not go with loss beyond tail, which holds a day’s loss against the tail figure. Leave it out.',
    instead: [''],
  });

const add = (line: VerbLine): Attempt<ReadLine> => {
  const idle = nothingToDo(line, named);
  if (!idle.ok) return idle;
  const of = firstOf(line.pieces, 'watched')?.watched ?? null;
  if (of === null) return faulty(missing(line, `What to watch is missing. ${whatIsWatched}`, ['tail']));
  const fitting = mismatch(line, of);
  if (!fitting.ok) return fitting;
  if (line.tickers.length === 0) {
    const first = line.context.vocabulary.nearest('', 1).map((ticker) => `\`${ticker}\``);
    return faulty({
      ...missing(line, 'watch needs a ticker and none was given. Name one; feed lists them.', first),
      code: 'noTicker',
    });
  }
  const taking = createTaking();
  const tail = takeTail(taking, line);
  if (!tail.ok) return tail;
  return attained(
    ofEachTicker(
      line,
      taking.assumed,
      (ticker): WatchQuestion => ({
        verb: 'watch',
        do: 'add',
        watched: of,
        crossing: firstOf(line.pieces, 'crossing')?.crossing ?? null,
        tail: { ...tail.value, ticker },
      }),
    ),
  );
};

const notForWatches = (line: VerbLine): Attempt<ReadLine> => {
  const [placed] = allOf(line.pieces, 'doing');
  const message =
    'A watch cannot be changed or shown now. Stop it and make another; ask the tail itself for now.';
  const list = [{ first: 0, wordCount: line.words.length, text: 'watch list' }];
  const fault = missing(line, message, []);
  return faulty({
    ...fault,
    code: 'notForVerb',
    first: placed?.first ?? 0,
    wordCount: placed?.wordCount ?? 1,
    repairs: [list],
  });
};

const read = (line: VerbLine): Attempt<ReadLine> => {
  const asked = firstOf(line.pieces, 'doing')?.doing ?? 'add';
  if (asked === 'add') return add(line);
  if (asked === 'change' || asked === 'now') return notForWatches(line);
  const kinds: ReadonlySet<PieceKind> = new Set(asked === 'list' ? [] : ['subscriptionId']);
  const alone = onlyThese(line, kinds, `watch ${asked}`);
  if (!alone.ok) return alone;
  if (asked === 'list') return attained({ questions: [{ verb: 'watch', do: 'list' }], assumed: [] });
  const id = idOf(line, named);
  if (!id.ok) return id;
  return attained({ questions: [{ verb: 'watch', do: asked, id: id.value }], assumed: [] });
};

/** A line that somebody wants to be told of when it is crossed. */
export const watch: VerbReader = {
  verb: 'watch',
  takes: new Set<PieceKind>([
    'ticker',
    'window',
    'level',
    'confidence',
    'horizon',
    'model',
    'log',
    'doing',
    'watched',
    'crossing',
    'subscriptionId',
  ]),
  tickers: { least: 0, most: limits.tickersPerQuestion },
  recognise,
  ownWords: [...languageWords, ...doingWords, 'loss', 'tail'],
  settle: (line, pieces) => settleLevels(line, pieces),
  read,
};
