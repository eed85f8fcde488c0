import { type Day, isoFromDay } from '../../terms/day.ts';
import { counted, instantInWords, listed } from '../../wording/words.ts';
import { caution, type Passage, type Reply, reply } from '../reply.ts';

/** What an answer on record is told with. */
export type RecordInWords = {
  readonly id: string;
  readonly question: string;
  readonly asOf: string;
  readonly methodVersion: string;
  readonly firstAskedAtMs: number;
  readonly askedTimes: number;
  readonly nodeVersion: string;
  /** The sentence of its reply. */
  readonly headline: string;
};

type Change = {
  readonly ticker: string;
  readonly keptCount: number;
  readonly restatedCount: number;
  readonly firstRestated: Day | null;
  readonly goneCount: number;
  readonly insertedCount: number;
  readonly newCount: number;
  readonly lastDay: Day | null;
};

type Difference = { readonly path: string; readonly before: string; readonly after: string };

export type AgainInWords = {
  readonly record: RecordInWords;
  /** Why it cannot be worked out at all any more, where it cannot. */
  readonly refused: string | null;
  /** Whether every figure is the same to the last bit. */
  readonly same: boolean;
  /** Whether what stands around the figures (cautions, notes, working) is the same too. */
  readonly sameWords: boolean;
  readonly differences: readonly Difference[];
  readonly methodVersionNow: string;
  readonly nodeVersionNow: string;
  /** What became of the prices; a sentence where there are none to compare with. */
  readonly changes: readonly (Change | string)[];
  /** The headline on the days kept with the closes of today; null where the past was not changed. */
  readonly restated: string | null;
  readonly today: string;
};

const mostDifferences = 8;

const majorOf = (version: string): string => version.split('.')[0] ?? version;

const reasonFor = ({ record, methodVersionNow, nodeVersionNow }: AgainInWords): string => {
  if (record.methodVersion !== methodVersionNow)
    return `It was worked out by method version ${record.methodVersion}, and this is version ${methodVersionNow}.`;
  if (majorOf(record.nodeVersion) !== majorOf(nodeVersionNow))
    return (
      `It was worked out on Node ${record.nodeVersion}, and this is ${nodeVersionNow}: ` +
      'between major versions the last bits of exponentials and logarithms may differ.'
    );
  return 'Neither the method nor the major version of Node has changed since, so this is a fault. Tell the operator.';
};

const sentenceOf = (again: AgainInWords): string => {
  const { id } = again.record;
  if (again.refused !== null) return `${id} cannot be worked out again from the prices kept with it.`;
  return again.same
    ? `${id} comes out the same to the last bit from the prices kept with it.`
    : `${id} comes out otherwise from the prices kept with it.`;
};

const differencePassage = (again: AgainInWords): readonly Passage[] => {
  if (again.refused !== null) return [{ head: 'Why', lines: [again.refused] }];
  if (again.same)
    return again.sameWords
      ? []
      : [
          {
            head: null,
            lines: ['Every figure is the same; cautions, notes or working are put otherwise now.'],
          },
        ];
  const shown = again.differences.slice(0, mostDifferences);
  const more = again.differences.length - shown.length;
  const lines = shown.map(({ path, before, after }) => `${path}: ${before} then, ${after} now`);
  const rest = more > 0 ? [`and ${counted(more, 'more figure')}`] : [];
  return [{ head: 'What differs', lines: [reasonFor(again), ...lines, ...rest] }];
};

const changeInWords = (change: Change | string): string => {
  if (typeof change === 'string') return change;
  const { ticker, keptCount, restatedCount, firstRestated, goneCount, insertedCount, newCount, lastDay } =
    change;
  const parts = [
    ...(restatedCount > 0 && firstRestated !== null
      ? [
          `${restatedCount} of ${counted(keptCount, 'close')} restated, the first on ${isoFromDay(firstRestated)}`,
        ]
      : []),
    ...(goneCount > 0 ? [`${counted(goneCount, 'day')} gone`] : []),
    ...(insertedCount > 0 ? [`${counted(insertedCount, 'day')} put in between`] : []),
    ...(newCount > 0 && lastDay !== null
      ? [`${counted(newCount, 'new day')}, to ${isoFromDay(lastDay)}`]
      : []),
  ];
  return parts.length === 0
    ? `${ticker}: no close was changed and no day is new.`
    : `${ticker}: ${listed(parts)}.`;
};

const thenPassage = ({ record, nodeVersionNow }: AgainInWords, timeZone: string): Passage => ({
  head: 'Then',
  lines: [
    `${record.question}, first asked ${instantInWords(record.firstAskedAtMs, timeZone)}, on Node ${record.nodeVersion} (now ${nodeVersionNow}).`,
    record.headline,
  ],
});

const lineOf = (record: RecordInWords): string =>
  `Data to ${record.asOf}, method version ${record.methodVersion}, asked ${counted(record.askedTimes, 'time')}, ${record.id}`;

/** One answer on record, worked out again from its own prices and on those of today. */
export const againReply = (again: AgainInWords, timeZone: string): Reply =>
  reply('record', sentenceOf(again), {
    passages: [
      thenPassage(again, timeZone),
      ...differencePassage(again),
      { head: 'The prices since', lines: again.changes.map(changeInWords) },
      ...(again.restated === null
        ? []
        : [{ head: 'On the same days, with the prices of today', lines: [again.restated] }]),
      { head: 'On the prices of today', lines: [again.today] },
    ],
    quietLine: lineOf(again.record),
    caution,
  });

type Trait = { readonly name: string; readonly first: string; readonly second: string };

/** What two answers on record differ in, a line each, and what each says. */
export const differReply = (first: RecordInWords, second: RecordInWords, traits: readonly Trait[]): Reply => {
  const names = traits.map(({ name }) => name.toLowerCase());
  return reply(
    'record',
    traits.length === 0
      ? `${first.id} and ${second.id} agree in everything that is compared.`
      : `${first.id} and ${second.id} differ in ${listed(names)}.`,
    {
      passages: [
        ...(traits.length === 0
          ? []
          : [
              {
                head: 'What differs',
                lines: traits.map((trait) => `${trait.name}: ${trait.first} against ${trait.second}`),
              },
            ]),
        { head: first.id, lines: [`${first.question}:`, first.headline] },
        { head: second.id, lines: [`${second.question}:`, second.headline] },
      ],
      caution,
    },
  );
};
