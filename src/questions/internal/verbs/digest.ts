import type { Schedule } from '../../../terms/subscriptions.ts';
import { clockText } from '../../../terms/zonedTime.ts';
import { limits } from '../../limits.ts';
import type { DigestChange, DigestFigure, DigestQuestion } from '../../question.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf, firstOf, has, type PieceKind } from '../pieces/piece.ts';
import type { Recogniser } from '../recognisers/recogniser.ts';
import { asClock, clock } from '../recognisers/schedule/clock.ts';
import { scheduleDays, scheduleDayWords } from '../recognisers/schedule/days.ts';
import { doing, doingWords } from '../recognisers/schedule/doings.ts';
import { zone } from '../recognisers/schedule/zone.ts';
import { languageWords } from '../recognisers/table.ts';
import { settleLevels } from './settle.ts';
import { idOf, nothingToDo, onlyThese } from './subscriptionId.ts';
import { takeTailLevel } from './tailLevel.ts';
import { createTaking, type Taking } from './taking.ts';
import { faultAtPiece, missing, type ReadLine, type VerbLine, type VerbReader } from './verbReader.ts';

const named = { noun: 'digest', letter: 'D' } as const;

const recognise: Recogniser = (line, at) =>
  doing(line, at) ?? scheduleDays(line, at) ?? clock(line, at) ?? zone(line, at);

const takeSchedule = (taking: Taking, { pieces, context }: VerbLine): Schedule => {
  const { minutes, timeZone } = context.defaults.digest;
  return {
    days: taking.orDefault(firstOf(pieces, 'scheduleDays')?.days ?? null, { kind: 'sessions' }, 'sessions'),
    minutes: taking.orDefault(firstOf(pieces, 'clock')?.minutes ?? null, minutes, clockText(minutes)),
    timeZone: taking.orDefault(firstOf(pieces, 'timeZone')?.timeZone ?? null, timeZone, timeZone),
  };
};

const takeFigure = (taking: Taking, line: VerbLine): Attempt<DigestFigure> => {
  const { pieces, context } = line;
  const { window, level, model } = context.defaults.digest;
  const tailLevel = takeTailLevel(taking, line, level);
  if (!tailLevel.ok) return tailLevel;
  const asked = firstOf(pieces, 'window')?.window ?? null;
  return attained({
    window: asked ?? window,
    tailLevel: tailLevel.value,
    model: taking.orDefault(firstOf(pieces, 'model')?.model ?? null, model, `by ${model}`),
  });
};

const add = (line: VerbLine): Attempt<ReadLine> => {
  const idle = nothingToDo(line, named);
  if (!idle.ok) return idle;
  if (line.tickers.length === 0) {
    const first = line.context.vocabulary.nearest('', 1).map((ticker) => `\`${ticker}\``);
    const message = 'digest needs tickers and none was given. Name them; digest list shows what is there.';
    const list = [{ first: 0, wordCount: line.words.length, text: 'digest list' }];
    const fault = missing(line, message, first);
    const bare = line.pieces.every(({ piece }) => piece.kind === 'verb' || piece.kind === 'filler');
    return faulty({ ...fault, code: 'noTicker', repairs: bare ? [list, ...fault.repairs] : fault.repairs });
  }
  const taking = createTaking();
  const schedule = takeSchedule(taking, line);
  const figure = takeFigure(taking, line);
  if (!figure.ok) return figure;
  const question: DigestQuestion = {
    verb: 'digest',
    do: 'add',
    tickers: line.tickers,
    schedule,
    ...figure.value,
  };
  return attained({ questions: [question], assumed: taking.assumed });
};

const changeOf = (line: VerbLine): Attempt<DigestChange> => {
  const { pieces, tickers } = line;
  const level = firstOf(pieces, 'level')?.level ?? null;
  const tailLevel = level === null ? attained(null) : takeTailLevel(createTaking(), line, level);
  if (!tailLevel.ok) return tailLevel;
  return attained({
    tickers,
    days: firstOf(pieces, 'scheduleDays')?.days ?? null,
    minutes: firstOf(pieces, 'clock')?.minutes ?? null,
    timeZone: firstOf(pieces, 'timeZone')?.timeZone ?? null,
    window: firstOf(pieces, 'window')?.window ?? null,
    tailLevel: tailLevel.value,
    model: firstOf(pieces, 'model')?.model ?? null,
  });
};

const changeable: readonly PieceKind[] = [
  'ticker',
  'scheduleDays',
  'clock',
  'timeZone',
  'window',
  'level',
  'model',
];

const change = (line: VerbLine): Attempt<ReadLine> => {
  const id = idOf(line, named);
  if (!id.ok) return id;
  if (!changeable.some((kind) => has(line.pieces, kind))) {
    const message =
      'What to change is missing. Add a time, days, tickers or a level, such as digest change D-12 09:00.';
    return faulty(missing(line, message, ['09:00']));
  }
  const changed = changeOf(line);
  if (!changed.ok) return changed;
  return attained({
    questions: [{ verb: 'digest', do: 'change', id: id.value, change: changed.value }],
    assumed: [],
  });
};

/** Only what is shown now can be drawn, and nothing of a digest is had as data. */
const wrongWish = (line: VerbLine, asked: string): Attempt<null> => {
  const unwanted = allOf(line.pieces, 'wish').find(({ piece }) => asked !== 'now' || piece.wish === 'json');
  if (unwanted === undefined) return attained(null);
  const says = 'goes with digest now and a picture alone. Leave it out.';
  return faulty(faultAtPiece(line, unwanted, { code: 'notForVerb', says, instead: [''] }));
};

const read = (line: VerbLine): Attempt<ReadLine> => {
  const asked = firstOf(line.pieces, 'doing')?.doing ?? 'add';
  const wished = wrongWish(line, asked);
  if (!wished.ok) return wished;
  if (asked === 'add') return add(line);
  if (asked === 'change') return change(line);
  const kinds: ReadonlySet<PieceKind> = new Set(asked === 'list' ? [] : ['subscriptionId', 'wish']);
  const alone = onlyThese(line, kinds, `digest ${asked}`);
  if (!alone.ok) return alone;
  if (asked === 'list') return attained({ questions: [{ verb: 'digest', do: 'list' }], assumed: [] });
  const id = idOf(line, named);
  if (!id.ok) return id;
  return attained({ questions: [{ verb: 'digest', do: asked, id: id.value }], assumed: [] });
};

export const digest: VerbReader = {
  verb: 'digest',
  takes: new Set<PieceKind>([...changeable, 'doing', 'subscriptionId', 'wish']),
  tickers: { least: 0, most: limits.tickersPerDigest },
  recognise,
  ownWords: [...languageWords, ...scheduleDayWords, ...doingWords],
  settle: (line, pieces) => settleLevels(line, pieces, asClock),
  read,
};
