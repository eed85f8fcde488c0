import { answeredVerbs } from '../answers/answerQuestion.ts';
import type { Settings } from '../config/schema.ts';
import type { QuestionDefaults } from '../questions/readMessage.ts';
import { createVocabulary } from '../questions/vocabulary.ts';
import type { Clock } from '../terms/clock.ts';
import type { FeedStatus } from '../terms/feedReport.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import type { Result } from '../terms/result.ts';
import type { Desk } from '../workspaces/desk.ts';
import { everythingAllowed, type Permissions } from '../workspaces/permissions.ts';
import type { Drawing } from '../workspaces/pictures.ts';
import type { DeskPins } from '../workspaces/pins/ports.ts';
import type { DeskRecords } from '../workspaces/records/ports.ts';
import type { DeskSubscriptions } from '../workspaces/subscriptions/ports.ts';
import type { Compute } from './compute/compute.ts';
import { helpPageOf } from './helpPages.ts';
import { policyOf } from './policy.ts';
import { dayAt, dayStartMs } from './today.ts';

export type DeskParts = {
  readonly settings: Settings;
  readonly clock: Clock;
  readonly snapshot: () => Result<PriceSnapshot>;
  readonly feedStatus: () => FeedStatus;
  readonly compute: Compute;
  readonly records: DeskRecords;
  readonly drawing: Drawing;
  readonly subscriptions: DeskSubscriptions;
  /** Without them: a place that belongs to one person alone. */
  readonly permissions?: Permissions;
  /** Where cards are put up; without it they are only listed. */
  readonly wall?: DeskPins['wall'];
};

const builtVerbs = ['help', 'feed', 'again', 'records', 'pin', 'unpin', 'digest', 'watch', ...answeredVerbs];

const noVocabulary = createVocabulary([]);

/** A snapshot’s vocabulary is made once; snapshots are few and long-lived. */
const vocabularies = (cities: ReadonlyMap<string, string>) => {
  const made = new WeakMap<PriceSnapshot, ReturnType<typeof createVocabulary>>();
  return (snapshot: PriceSnapshot | null) => {
    if (snapshot === null) return noVocabulary;
    const known =
      made.get(snapshot) ?? createVocabulary([...snapshot.tickers, ...snapshot.quarantined.keys()], cities);
    made.set(snapshot, known);
    return known;
  };
};

/** What questions take that do not say it. */
export const questionDefaults = ({ defaults, digests, deskTimeZone }: Settings): QuestionDefaults => ({
  ...defaults,
  digest: {
    window: defaults.tail.window,
    level: digests.level,
    model: digests.model,
    minutes: digests.time,
    timeZone: deskTimeZone,
  },
});

/** The desk as a conversation sees it, wired from settings, feed and machinery. */
export const createDesk = (parts: DeskParts): Desk => {
  const { settings, clock, snapshot, feedStatus, compute, records } = parts;
  const vocabularyOf = vocabularies(new Map(Object.entries(settings.digests.cities)));
  return {
    snapshot,
    contextFor: (live) => ({
      vocabulary: vocabularyOf(live),
      today: dayAt(clock.nowMs(), settings.deskTimeZone),
      defaults: questionDefaults(settings),
      builtVerbs,
    }),
    compute: compute.answer,
    policy: policyOf(settings),
    clock,
    feedStatus,
    timeZone: settings.deskTimeZone,
    dayStartMs: (day) => dayStartMs(day, settings.deskTimeZone),
    helpPage: helpPageOf(builtVerbs),
    records,
    drawing: parts.drawing,
    permissions: parts.permissions ?? everythingAllowed,
    subscriptions: parts.subscriptions,
    pins: { store: records.store.pins, wall: parts.wall ?? (() => null) },
  };
};
