import type { DigestPicture } from '../../answers/pictures/pictureData.ts';
import { digestNowReply } from '../../present/compose/scheduled/digest.ts';
import type { ReadQuestion, SubscriptionQuestion } from '../../questions/question.ts';
import { isoFromDay } from '../../terms/day.ts';
import type { DigestPost } from '../../terms/scheduledPosts.ts';
import { refused, type Spoken, said } from '../conversation.ts';
import type { Desk } from '../desk.ts';
import type { Asker } from '../permissions.ts';
import { pictured } from '../pictured.ts';
import { answerOfSubscriptions, digestFor } from './answerSubscriptions.ts';
import { returnsAfter } from './asking.ts';

/** Sessions that the strips of a picture show, and the calendar days that hold them. */
const sessionsShown = 60;
const daysShown = 100;

/** What a picture of a digest shows: its lines, and the last returns of each ticker. */
const pictureOf = (desk: Desk, post: DigestPost): DigestPicture => {
  const live = desk.snapshot();
  const days = post.lines.flatMap((line) => (line.ok ? [line.asOf] : []));
  const asOf = days.length === 0 ? 0 : Math.max(...days);
  const returnsOf = (ticker: string): readonly number[] => {
    const series = live.ok ? live.value.series(ticker) : null;
    return series === null
      ? []
      : returnsAfter(series, asOf - daysShown, 'simple')
          .slice(-sessionsShown)
          .map(({ value }) => value);
  };
  const { id, tailLevel, confidenceLevel, model, lines } = post;
  const rows = lines.map((line) => ({ line, returns: returnsOf(line.ticker) }));
  return { kind: 'digest', id, asOf: isoFromDay(asOf), tailLevel, confidenceLevel, model, rows };
};

const nowInPicture = async (desk: Desk, asker: Asker, id: string): Promise<Spoken> => {
  const post = await digestFor(desk, asker, id);
  if (!post.ok) return refused(post);
  return pictured(said(digestNowReply(post.value)), await desk.drawing.drawData(pictureOf(desk, post.value)));
};

/** What is said to a question about digests and watches, with its picture where one is wanted. */
export const spokenOfSubscriptions = async (
  desk: Desk,
  { assumed, wishes }: Pick<ReadQuestion, 'assumed' | 'wishes'>,
  question: SubscriptionQuestion,
  asker: Asker,
): Promise<Spoken> => {
  if (question.do === 'now' && wishes.includes('picture')) return nowInPicture(desk, asker, question.id);
  const done = await answerOfSubscriptions(desk, { question, assumed, asker });
  return done.ok ? said(done.value) : refused(done);
};
