import type { InstantMs } from '../../terms/clock.ts';
import type { Restatement } from '../../terms/feedReport.ts';
import type { Problem } from '../../terms/problem.ts';
import type { Result } from '../../terms/result.ts';
import type { OpenSnapshot } from '../openFeed.ts';
import type { LiveFeedPorts } from './ports.ts';
import { replacementProblem } from './replacement.ts';
import { restatementsBetween } from './restatements.ts';

/** What a live feed knows. One object, changed in place by the looks, which follow one another. */
export type FeedState = {
  live: OpenSnapshot | null;
  swappedAt: InstantMs | null;
  restatements: readonly Restatement[];
  problem: Problem | null;
  problemAt: InstantMs | null;
  /** Signature of the files at the last reading, whatever came of it. */
  readSignature: string | null;
  seenSignature: string | null;
  unsettledSince: InstantMs | null;
  /** A reading that may be of half a file, kept until the file has rested for longer. */
  held: {
    readonly signature: string;
    readonly reading: Result<OpenSnapshot>;
    readonly sinceMs: InstantMs;
  } | null;
};

export const emptyState = (): FeedState => ({
  live: null,
  swappedAt: null,
  restatements: [],
  problem: null,
  problemAt: null,
  readSignature: null,
  seenSignature: null,
  unsettledSince: null,
  held: null,
});

const sameFlags = (first: OpenSnapshot, second: OpenSnapshot): boolean =>
  JSON.stringify([first.report.findings, [...first.quarantined]]) ===
  JSON.stringify([second.report.findings, [...second.quarantined]]);

const says = (first: Problem | null, second: Problem): boolean => first?.message === second.message;

export type Intake = {
  readonly take: (reading: Result<OpenSnapshot>) => Promise<void>;
  readonly refuseWith: (why: Problem) => void;
};

/** Takes in what a reading came to: swaps it in, or keeps what there is and tells why. */
export const makeIntake = (
  path: string,
  ports: Pick<LiveFeedPorts, 'nowMs' | 'tell'>,
  state: FeedState,
): Intake => {
  const refuseWith = (why: Problem): void => {
    const isNews = !says(state.problem, why);
    state.problem = why;
    if (!isNews) return;
    state.problemAt = ports.nowMs();
    ports.tell({ kind: 'refused', problem: why, hasPrices: state.live !== null });
  };
  const recover = (snapshot: OpenSnapshot): void => {
    if (state.problem === null) return;
    state.problem = null;
    state.problemAt = null;
    ports.tell({ kind: 'recovered', snapshot });
  };
  const swap = async (next: OpenSnapshot): Promise<void> => {
    const before = state.live;
    const restatements = before === null ? [] : await restatementsBetween(before, next);
    state.live = next;
    state.swappedAt = ports.nowMs();
    state.restatements = restatements;
    state.problem = null;
    state.problemAt = null;
    ports.tell({ kind: 'swapped', snapshot: next, restatements });
  };
  const take = async (reading: Result<OpenSnapshot>): Promise<void> => {
    if (!reading.ok) return refuseWith(reading.problem);
    const next = reading.value;
    const { live } = state;
    if (live !== null && live.fingerprint === next.fingerprint && sameFlags(live, next)) return recover(live);
    const why = live === null ? null : replacementProblem(live, next, path);
    return why === null ? swap(next) : refuseWith(why);
  };
  return { take, refuseWith };
};
