import type { Clock } from '../../terms/clock.ts';
import type { Result } from '../../terms/result.ts';
import type {
  Calendar,
  ChanceOfNonGreen,
  Deliver,
  PlaceState,
  PricesNow,
  SubscriptionStore,
} from '../ports.ts';

/** The calendars of one reading of the holidays; another object where they have changed. */
export type Calendars = { readonly of: (tickers: readonly string[]) => Calendar };

/** What a run of what is due needs of the rest. */
export type RunParts = {
  readonly team: string;
  /** This copy of the bot among all that share the store. */
  readonly holder: string;
  readonly store: SubscriptionStore;
  readonly clock: Clock;
  readonly prices: () => Result<PricesNow>;
  readonly calendars: () => Calendars;
  readonly deliver: Deliver;
  readonly placeState: PlaceState;
  readonly chanceOfNonGreen: ChanceOfNonGreen;
  readonly mostLateMs: number;
  readonly waitForPricesMs: number;
  /** Lets only so many digests be made at the same time. */
  readonly inTurn: <T>(work: () => Promise<T>) => Promise<T>;
  /** Tells the operator. */
  readonly tell: (message: string) => void;
};

/** Long enough to work out the largest digest; whoever crashed with it is replaced after that. */
export const leaseMs = 5 * 60_000;
