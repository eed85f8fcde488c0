import type { InstantMs } from '../../terms/clock.ts';
import type { Restatement } from '../../terms/feedReport.ts';
import type { Problem } from '../../terms/problem.ts';
import type { Result } from '../../terms/result.ts';
import type { OpenSnapshot } from '../openFeed.ts';
import type { FileState } from '../priceFiles.ts';

/** What the desk is told, once each: new prices, prices that were refused, or that a refusal is over. */
export type FeedEvent =
  | {
      readonly kind: 'swapped';
      readonly snapshot: OpenSnapshot;
      readonly restatements: readonly Restatement[];
    }
  | { readonly kind: 'refused'; readonly problem: Problem; readonly hasPrices: boolean }
  | { readonly kind: 'recovered'; readonly snapshot: OpenSnapshot };

/** What a live feed needs of the world. */
export type LiveFeedPorts = {
  /** The price files and what else the reading hangs on, as they stand now. */
  readonly look: () => Promise<{
    readonly files: readonly FileState[];
    readonly beside: readonly FileState[];
  }>;
  readonly open: (files: readonly FileState[], nowMs: InstantMs) => Promise<Result<OpenSnapshot>>;
  readonly nowMs: () => InstantMs;
  /** Calls back after a while, once. */
  readonly later: (delayMs: number, call: () => void) => { readonly cancel: () => void };
  /** Calls back whenever something in the place of the files seems to have changed. */
  readonly watch: (call: () => void) => { readonly close: () => void };
  readonly tell: (event: FeedEvent) => void;
};
