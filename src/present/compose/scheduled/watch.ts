import { isoFromDay } from '../../../terms/day.ts';
import type { WatchPost, WatchReading } from '../../../terms/scheduledPosts.ts';
import { levelInWords, percent, typedPercent } from '../../../wording/percent.ts';
import { possessive } from '../../../wording/words.ts';
import { caution, type Reply, reply } from '../../reply.ts';
import { written } from '../tail.ts';
import { pauseButton } from './pauseButton.ts';

/** What is needed to say what a watch sees. */
export type Watching = Pick<WatchPost, 'ticker' | 'tailLevel' | 'confidenceLevel' | 'model'>;

const figureNames = { var: 'VaR', es: 'ES', loss: 'VaR' } as const;

const figureName = ({ ticker, tailLevel }: Watching, { of }: WatchReading): string =>
  `${possessive(ticker)} ${levelInWords(tailLevel)} ${figureNames[of]}`;

/** `4.21% (at 95% 3.9 to 4.6)`. */
const figureInWords = ({ value, lower, upper }: WatchReading, { confidenceLevel }: Watching): string => {
  const { estimate, range } = written(value, lower, upper, null);
  return range === 'no interval'
    ? `${estimate}%`
    : `${estimate}% (at ${levelInWords(confidenceLevel)} ${range})`;
};

const sides = { above: ['above', 'back under'], below: ['below', 'back over'] } as const;

const firedInWords = (post: Watching, reading: WatchReading): string => {
  if (reading.of !== 'loss')
    return `${figureName(post, reading)} is ${sides[reading.side][0]} ${typedPercent(reading.line)} now: ${figureInWords(reading, post)}.`;
  const made = reading.lineDay === null ? '' : `, made from prices to ${isoFromDay(reading.lineDay)}`;
  return `${post.ticker} lost ${percent(reading.value)} on ${isoFromDay(reading.day)}, more than its ${levelInWords(post.tailLevel)} VaR of ${percent(reading.line)}${made}.`;
};

const clearedInWords = (post: Watching, reading: WatchReading): string =>
  `${figureName(post, reading)} has been ${sides[reading.side][1]} ${typedPercent(reading.line)} for two sessions: ${figureInWords(reading, post)}.`;

const sentenceOf = (post: WatchPost): string => {
  const { event, reading, reason } = post;
  if (reading === null || event === 'cannotTell')
    return `${post.id} cannot tell: ${reason ?? 'there is no figure.'}`;
  return event === 'fired' ? firedInWords(post, reading) : clearedInWords(post, reading);
};

const restatedWarning =
  'prices of days that had been looked at were restated since; that alone sets no watch off';

/** What a watch says when it speaks. */
export const watchReply = (post: WatchPost): Reply => {
  const { reading } = post;
  const data = reading === null ? '' : `, data to ${isoFromDay(reading.day)}, ${reading.answerId}`;
  return reply('answer', sentenceOf(post), {
    warnings: post.restated ? [restatedWarning] : [],
    quietLine: `${post.id}, ${post.question}${data}`,
    caution,
    buttons: [pauseButton(post.id, 'Pause this watch')],
  });
};

/** What a watch sees when it is made: nothing is set off by it. */
export const watchNowInWords = (post: Watching, reading: WatchReading): string => {
  if (reading.of === 'loss')
    return `Its ${levelInWords(post.tailLevel)} VaR is ${figureInWords(reading, post)} now; the losses after ${isoFromDay(reading.day)} are held against the figure of the session before each.`;
  const beyond = reading.side === 'above' ? reading.value > reading.line : reading.value < reading.line;
  const already = beyond
    ? `already ${reading.side} the line, so it speaks once it has been back for two sessions`
    : 'on the quiet side of the line';
  return `${figureName(post, reading)} is ${figureInWords(reading, post)} now, ${already}.`;
};
