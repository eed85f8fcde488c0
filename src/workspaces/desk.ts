import type { Answers } from '../answers/answer.ts';
import type { AnswerJob } from '../answers/answerQuestion.ts';
import type { AnswerPolicy } from '../answers/policy.ts';
import type { HelpPage } from '../present/compose/help.ts';
import type { ReadContext } from '../questions/readMessage.ts';
import type { Clock, InstantMs } from '../terms/clock.ts';
import type { Day } from '../terms/day.ts';
import type { FeedStatus } from '../terms/feedReport.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import type { Result } from '../terms/result.ts';
import type { Permissions } from './permissions.ts';
import type { Drawing } from './pictures.ts';
import type { DeskPins } from './pins/ports.ts';
import type { DeskRecords } from './records/ports.ts';
import type { DeskSubscriptions } from './subscriptions/ports.ts';

/** What a conversation needs of the rest of the house. */
export type Desk = {
  /** The live snapshot of the feed, or why there is none. Each question takes it once and ends on it. */
  readonly snapshot: () => Result<PriceSnapshot>;
  readonly contextFor: (snapshot: PriceSnapshot | null) => ReadContext;
  readonly compute: (job: AnswerJob, progress?: (words: string) => void) => Promise<Result<Answers>>;
  readonly policy: AnswerPolicy;
  readonly clock: Clock;
  readonly feedStatus: () => FeedStatus;
  /** IANA zone in which instants are shown. */
  readonly timeZone: string;
  /** The instant at which a day begins in that zone. */
  readonly dayStartMs: (day: Day) => InstantMs;
  readonly helpPage: (topic: string | null) => HelpPage;
  readonly records: DeskRecords;
  readonly drawing: Drawing;
  readonly permissions: Permissions;
  /** null where no digest and no watch can be kept. */
  readonly subscriptions: DeskSubscriptions | null;
  readonly pins: DeskPins;
};
