import type { Settings } from '../../config/schema.ts';
import { asksOf } from '../../digests/body.ts';
import { createMaking } from '../../digests/making.ts';
import type { SubscriptionStore } from '../../digests/ports.ts';
import { createInTurn } from '../../digests/run/inTurn.ts';
import type { RunParts } from '../../digests/run/parts.ts';
import type { OpenSnapshot } from '../../feed/openFeed.ts';
import { nonGreenChance } from '../../stats/backtests/nonGreenChance.ts';
import type { Clock } from '../../terms/clock.ts';
import type { Result } from '../../terms/result.ts';
import type { DeskRecords } from '../../workspaces/records/ports.ts';
import type { DeskSubscriptions } from '../../workspaces/subscriptions/ports.ts';
import type { Compute } from '../compute/compute.ts';
import { policyOf } from '../policy.ts';
import { calendarsFrom } from './calendars.ts';
import { pricesFrom } from './pricesNow.ts';

export type SubscriptionParts = {
  readonly settings: Settings;
  readonly clock: Clock;
  readonly snapshot: () => Result<OpenSnapshot>;
  readonly compute: Pick<Compute, 'answer'>;
  readonly records: DeskRecords;
  readonly store: SubscriptionStore;
};

/** So many digests are made at the same time: their questions wait for the same threads. */
const madeAtOnce = 2;

/** Threads take questions in order: what a person asks waits behind at most so many of a digest’s. */
const questionsAtOnce = 2;

const minuteMs = 60_000;

/** What both a conversation and the run of what is due need, and the conversation’s own part. */
export type Subscriptions = {
  readonly ofDesk: DeskSubscriptions;
  readonly ofRun: Omit<RunParts, 'team' | 'holder' | 'deliver' | 'placeState' | 'tell'>;
};

export const createSubscriptions = (parts: SubscriptionParts): Subscriptions => {
  const { settings, clock, snapshot, compute, records, store } = parts;
  const { waitForPricesMinutes, mostLateHours } = settings.digests;
  const askInTurn = createInTurn(questionsAtOnce);
  const ofRun = {
    store,
    clock,
    prices: pricesFrom(
      {
        compute: (job) => askInTurn(() => compute.answer(job)),
        policy: policyOf(settings),
        records,
        clock,
        timeZone: settings.deskTimeZone,
      },
      snapshot,
    ),
    calendars: calendarsFrom(snapshot),
    chanceOfNonGreen: nonGreenChance,
    inTurn: createInTurn(madeAtOnce),
    waitForPricesMs: waitForPricesMinutes * minuteMs,
    mostLateMs: mostLateHours * 60 * minuteMs,
  };
  const making = createMaking({
    ...ofRun,
    defaults: {
      confidence: settings.defaults.tail.confidence,
      estimationReturns: settings.defaults.backtest.estimationReturns,
    },
  });
  return { ofRun, ofDesk: { ...making, store, keeps: records.keeps, asks: asksOf } };
};
