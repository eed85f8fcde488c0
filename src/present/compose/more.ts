import type { Answer, Answers, MeanAnswer } from '../../answers/answer.ts';
import type { MeanFigures } from '../../answers/interval/figures.ts';
import { significant } from '../../wording/digits.ts';
import { levelInWords, percent, percentBounds } from '../../wording/percent.ts';
import { counted } from '../../wording/words.ts';
import { type Passage, type Reply, reply, type Table } from '../reply.ts';
import { onRecord, placeInWords } from './parts.ts';

/** The interval at every level of the ladder, each with the digits of its own width. */
const ladder = ({ figures: { mean, ladder: rungs } }: MeanAnswer): Table => ({
  columns: [
    { head: '% a day, at', align: 'left' },
    { head: 'from', align: 'right' },
    { head: 'to', align: 'right' },
  ],
  rows: rungs.map(({ confidenceLevel, lower, upper }) => {
    const written = percentBounds({ estimate: mean, lower, upper });
    return [levelInWords(confidenceLevel), written.lower ?? 'no bound', written.upper ?? 'no bound'];
  }),
});

const widthLines = ({ widths }: MeanFigures): readonly string[] =>
  widths.map(
    ({ returnCount, halfWidth }) =>
      `With ${counted(returnCount, 'return')}: ${percent(halfWidth)} either way.`,
  );

const boundsInWords = (mean: number, lower: number | null, upper: number | null): string =>
  placeInWords(percentBounds({ estimate: mean, lower, upper }), '%');

/** What the interval of the mean is not: the place of one further day, and the interval of the bell curve. */
const besideMean = ({ figures }: MeanAnswer): readonly Passage[] => {
  const { mean, predictionLower, predictionUpper, normalLower, normalUpper, lower, upper } = figures;
  const level = levelInWords(figures.confidenceLevel);
  const further = predictionLower !== null || predictionUpper !== null;
  return [
    {
      head: 'Half the width of the interval, were the days more of the same',
      lines: widthLines(figures),
    },
    {
      head: 'One further day',
      lines: [
        further
          ? `At ${level} one further day, not the mean, would lie ${boundsInWords(mean, predictionLower, predictionUpper)}.`
          : 'No place of one further day can be given from these returns.',
      ],
    },
    {
      head: 'Against the bell curve',
      lines: [
        `By Student’s t the mean lies ${boundsInWords(mean, lower, upper)}; by the bell curve, which takes the measured ` +
          `standard deviation for the true one, ${boundsInWords(mean, normalLower, normalUpper)}.`,
        ...(figures.skewness === null || figures.excessKurtosis === null
          ? []
          : [
              `Skewness ${significant(figures.skewness, 3)}, excess kurtosis ${significant(figures.excessKurtosis, 3)}; both are zero for a bell curve.`,
            ]),
      ],
    },
  ];
};

/** All cautions, notes and sources: what a reply has no room for, whatever its verb. */
export const reservations = (answer: Answer): readonly Passage[] => [
  ...(answer.warnings.length > 0
    ? [{ head: 'All cautions', lines: answer.warnings.map(({ text }) => text) }]
    : []),
  ...(answer.notes.length > 0 ? [{ head: 'Notes', lines: answer.notes.map(({ text }) => text) }] : []),
  { head: 'Sources', lines: answer.sources },
];

const shownFingerprint = 12;

const adjustments: Readonly<Record<Answer['priceAdjustment'], string>> = {
  none: 'closes not adjusted',
  splits: 'closes adjusted for splits',
  'splits+dividends': 'closes adjusted for splits and dividends',
  unknown: 'closes of which the desk has not said how they are adjusted',
};

const dataUsed = (answer: Answer): Passage => ({
  head: 'Prices used',
  lines: [
    `${answer.subject.join(', ')}: ${counted(answer.returnCount, `${answer.returnType} return`)} from ${answer.window.from} to ` +
      `${answer.window.to}, ${adjustments[answer.priceAdjustment]}; at most ` +
      `${counted(answer.longestGapDays, 'calendar day')} between two of them.`,
    ...(answer.droppedDates > 0
      ? [`${counted(answer.droppedDates, 'date')} left out, since not every ticker has a price on them.`]
      : []),
    `${counted(answer.periodsPerYear, 'day')} a year; method version ${answer.methodVersion}; prices ${answer.dataFingerprint.slice(0, shownFingerprint)}.`,
  ],
});

const moreReply = (answer: Answer): Reply => {
  const mean = answer.kind === 'interval mean' ? answer : null;
  return reply('working', `More figures of ${answer.id}: ${answer.question}.`, {
    table: mean === null ? null : ladder(mean),
    passages: [...(mean === null ? [] : besideMean(mean)), dataUsed(answer), ...reservations(answer)],
    whole: onRecord(answer),
  });
};

/** What stands behind an answer beside its working, posted beneath: further figures, the prices used, every caution, sources. */
export const moreReplies = (answers: Answers): readonly Reply[] => answers.map(moreReply);
