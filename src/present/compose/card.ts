import { type Reply, reply } from '../reply.ts';
import { fullCaution } from './help.ts';

/** What a card at the head of a discussion says of the result that it keeps there. */
export type CardInWords = {
  readonly answerId: string;
  readonly question: string;
  readonly sentence: string;
  /** ISO date of the last price used. */
  readonly asOf: string;
};

/** The card itself. It is read long after it was posted, by people who did not see what led to it, so the caution is whole. */
export const cardReply = ({ answerId, question, sentence, asOf }: CardInWords): Reply =>
  reply('record', sentence, {
    quietLine: `Data to ${asOf}, ${answerId}: ${question}`,
    caution: fullCaution,
  });

/** Said once in the thread of a card whose prices are no longer the newest. */
export const movedOnReply = ({ answerId, question, asOf }: CardInWords, lastDay: string): Reply =>
  reply(
    'record',
    `The pinned ${answerId} rests on prices to ${asOf}, and there are prices to ${lastDay} by now. Ask it anew for a figure of today: ${question}.`,
    { quietLine: `This is said once; again ${answerId} shows what has changed` },
  );

/** Said once in the thread of a card whose own prices read otherwise today. */
export const restatedReply = ({ answerId, asOf }: CardInWords, tickers: readonly string[]): Reply =>
  reply(
    'record',
    `Prices behind the pinned ${answerId} were restated: those of ${tickers.join(', ')} up to ${asOf} read otherwise today.`,
    { quietLine: `This is said once; again ${answerId} shows what the restated prices change` },
  );

/** The cards that stand in a place, the newest first. */
export const cardsReply = (cards: readonly CardInWords[]): Reply =>
  cards.length === 0
    ? reply('record', 'Nothing is pinned here.')
    : reply('record', `Pinned here: ${cards.length}.`, {
        passages: cards.map(({ sentence, answerId, asOf, question }) => ({
          head: sentence,
          lines: [`Data to ${asOf}, ${answerId}: ${question}`],
        })),
      });
