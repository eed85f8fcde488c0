import type { DigestPicture } from '../../../answers/pictures/pictureData.ts';
import type { DigestFigures } from '../../../terms/scheduledPosts.ts';
import { levelInWords, percent, percentBounds } from '../../../wording/percent.ts';
import { counted, listed } from '../../../wording/words.ts';
import { sheetMargin, sheetWidth, sizes } from '../look.ts';
import { textWidth } from '../metrics.ts';
import type { Domain } from '../panels/axes.ts';
import { digestStrip } from '../panels/digest.ts';
import type { Sheet } from '../sheet.ts';
import { altText } from './parts.ts';

const mostStrips = 16;

type Row = { readonly figures: DigestFigures; readonly returns: readonly number[] };

const withFigures = (rows: DigestPicture['rows']): readonly Row[] =>
  rows.flatMap(({ line, returns }) => (line.ok ? [{ figures: line, returns }] : []));

/** `2.72%, 2.40 to 3.19`: an end that there is not is said. */
const varInWords = ({ var: estimate, varLower, varUpper }: DigestFigures): string => {
  const bounds = { estimate, lower: varLower, upper: varUpper };
  const { estimate: written, lower, upper } = percentBounds(bounds, undefined, { plus: false });
  if (lower === null) return upper === null ? `${written}%` : `${written}%, up to ${upper}`;
  return `${written}%, ${upper === null ? `${lower} or more` : `${lower} to ${upper}`}`;
};

const rowInWords = (figures: DigestFigures): string =>
  `${figures.ticker} VaR ${varInWords(figures)}, last return ${percent(figures.lastReturn, 2, { plus: true })}` +
  `${figures.exceeded === true ? ', which exceeded the figure of the day before' : ''}`;

/** Labels, plot and words beside each other, as wide as the widest of each. */
const columnsOf = (rows: readonly Row[]) => {
  const widest = (texts: readonly string[], bold: boolean) =>
    Math.ceil(Math.max(0, ...texts.map((text) => textWidth(text, { fontSize: sizes.label, bold }))));
  const labels =
    widest(
      rows.map(({ figures }) => figures.ticker),
      true,
    ) + 10;
  const words = widest(
    rows.map(({ figures }) => varInWords(figures)),
    false,
  );
  return { labels, plot: sheetWidth - 2 * sheetMargin - labels - words - 10 };
};

/** The loss side has most of the room: it is what the figures are about. Higher returns are cut off. */
const lossesFirst = (rows: readonly Row[]): Domain => {
  const deepest = Math.max(...rows.map(({ figures }) => Math.max(figures.var, 0 - figures.lastReturn)));
  return [-1.35 * deepest, 0.6 * deepest];
};

const restInWords = (rows: DigestPicture['rows'], shown: number): readonly string[] => {
  const refused = rows.flatMap(({ line }) => (line.ok ? [] : [line.ticker]));
  const more = rows.length - refused.length - shown;
  return [
    ...(refused.length === 0 ? [] : [`Without a figure: ${listed(refused)}.`]),
    ...(more > 0 ? [`${counted(more, 'more ticker')} in the post.`] : []),
  ];
};

/** One strip for each ticker of a digest, all on the same scale, in the order of the post. */
export const digestSheet = (data: DigestPicture): Sheet => {
  const all = withFigures(data.rows);
  const rows = all.slice(0, mostStrips);
  const frame = columnsOf(rows);
  const days = Math.max(1, ...rows.map(({ returns }) => returns.length));
  const domain = lossesFirst(rows);
  const level = levelInWords(data.tailLevel);
  const rest = restInWords(data.rows, rows.length);
  return {
    title: `${level} VaR of a day, ${counted(rows.length, 'ticker')}`,
    lines: [
      `Sticks: the last ${counted(days, 'return')}; line: VaR by the ${data.model} model, shaded at ${levelInWords(data.confidenceLevel)}; mark: last return (▼ exceeded). One scale, ${percent(domain[0], 1)} to ${percent(domain[1], 1, { plus: true })}.`,
      ...rest,
    ],
    panelGap: 4,
    panels: rows.map(({ figures, returns }) =>
      digestStrip({ figures, returns, words: varInWords(figures), domain, days, frame }),
    ),
    corners: [`Data to ${data.asOf}`, data.id],
    fileName: `digest-${data.id}-${data.asOf}.png`,
    altText: altText([
      `One strip for each of ${counted(rows.length, 'ticker')}: last returns against the ${level} VaR of a day.`,
      `${rows.map(({ figures }) => rowInWords(figures)).join('; ')}.`,
      ...rest,
    ]),
  };
};
