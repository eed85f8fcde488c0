import type { InstantMs } from '../../terms/clock.ts';
import type { FeedStatus, Restatement } from '../../terms/feedReport.ts';
import { type Problem, problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { freshnessOfFeed } from '../freshness.ts';
import type { OpenSnapshot } from '../openFeed.ts';
import { type FileState, signatureOf } from '../priceFiles.ts';
import { replacementProblem } from './replacement.ts';
import { restatementsBetween } from './restatements.ts';

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

export type LiveFeedSettings = {
  readonly path: string;
  readonly deskTimeZone: string;
  readonly checkEverySeconds: number;
};

export type LiveFeed = {
  /** The prices to answer from. Take it once per question: a later swap does not touch it. */
  readonly snapshot: () => Result<OpenSnapshot>;
  readonly status: () => FeedStatus;
  /** Looks at the files now, as it happens by itself every few seconds. */
  readonly look: () => Promise<void>;
  readonly close: () => void;
};

/** Files must stand still this long before they are read: whoever writes them has then paused at least. */
export const settleMs = 500;
/** After this long without standing still the desk is told that the file is never whole. */
export const longestUnsettledMs = 60_000;

type State = {
  live: OpenSnapshot | null;
  swappedAt: InstantMs | null;
  restatements: readonly Restatement[];
  problem: Problem | null;
  problemAt: InstantMs | null;
  /** Signature of the files at the last reading, whatever came of it. */
  readSignature: string | null;
  seenSignature: string | null;
  unsettledSince: InstantMs | null;
};

const sameFlags = (first: OpenSnapshot, second: OpenSnapshot): boolean =>
  JSON.stringify([first.report.findings, [...first.quarantined]]) ===
  JSON.stringify([second.report.findings, [...second.quarantined]]);

const says = (first: Problem | null, second: Problem): boolean => first?.message === second.message;

/** Takes in what a reading came to. */
const makeIntake = (settings: LiveFeedSettings, ports: LiveFeedPorts, state: State) => {
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
    const why = live === null ? null : replacementProblem(live, next, settings.path);
    return why === null ? swap(next) : refuseWith(why);
  };
  return { take, refuseWith, recover };
};

const problemOfUnsettled = (path: string): Problem =>
  problem(
    'fileChanging',
    `${path} has been changing for a minute without a pause and cannot be read. Write it elsewhere and move it here.`,
  );

/** The prices that are served must outlive a reader that breaks, whatever broke it. */
const brokenReading = (path: string, error: unknown): Result<never> => {
  const reason = error instanceof Error ? error.message : String(error);
  return refuse(
    problem('fileUnreadable', `Reading ${path} broke off: ${reason}. Restart the bot if it stays so.`),
  );
};

/** Follows price files: reads a change beside the live prices and swaps it in whole, or keeps what there is and says so. */
export const startLiveFeed = async (settings: LiveFeedSettings, ports: LiveFeedPorts): Promise<LiveFeed> => {
  const state: State = {
    live: null,
    swappedAt: null,
    restatements: [],
    problem: null,
    problemAt: null,
    readSignature: null,
    seenSignature: null,
    unsettledSince: null,
  };
  const intake = makeIntake(settings, ports, state);

  const read = async (files: readonly FileState[], signature: string): Promise<void> => {
    const reading = await ports
      .open(files, ports.nowMs())
      .catch((error: unknown) => brokenReading(settings.path, error));
    if (!reading.ok && reading.problem.code === 'fileChanging') return;
    state.readSignature = signature;
    state.unsettledSince = null;
    await intake.take(reading);
  };

  /** Whether to look again soon. */
  const lookOnce = async (): Promise<boolean> => {
    const { files, beside } = await ports.look();
    const signature = signatureOf([...files, ...beside]);
    if (signature === state.readSignature) {
      state.seenSignature = signature;
      state.unsettledSince = null;
      return false;
    }
    const nowMs = ports.nowMs();
    state.unsettledSince ??= nowMs;
    const hasSettled = signature === state.seenSignature;
    state.seenSignature = signature;
    if (hasSettled) await read(files, signature);
    else if (nowMs - state.unsettledSince > longestUnsettledMs)
      intake.refuseWith(problemOfUnsettled(settings.path));
    return state.readSignature !== signature;
  };

  return follow(settings, ports, state, lookOnce, read);
};

const follow = async (
  settings: LiveFeedSettings,
  ports: LiveFeedPorts,
  state: State,
  lookOnce: () => Promise<boolean>,
  read: (files: readonly FileState[], signature: string) => Promise<void>,
): Promise<LiveFeed> => {
  let running: Promise<void> = Promise.resolve();
  let next: { readonly cancel: () => void } | null = null;
  let isSoon = false;
  let isClosed = false;

  const schedule = (soon: boolean): void => {
    next?.cancel();
    isSoon = soon;
    const delayMs = soon ? settleMs : settings.checkEverySeconds * 1000;
    next = isClosed ? null : ports.later(delayMs, () => void look());
  };
  // looks follow one another: two readings at a time would race for the swap
  const look = (): Promise<void> => {
    running = running.then(async () => schedule(await lookOnce()));
    return running;
  };

  const { files, beside } = await ports.look();
  const signature = signatureOf([...files, ...beside]);
  await read(files, signature);
  const watcher = ports.watch(() => {
    // a folder in which something is written all the time must not put the look off for ever
    if (!isSoon) schedule(true);
  });
  schedule(state.readSignature !== signature);
  return {
    snapshot: () => {
      if (state.live !== null) return succeed(state.live);
      return refuse(
        state.problem ??
          problem('feedMissing', `${settings.path} has not been read yet. Ask again in a moment.`),
      );
    },
    status: () => ({
      report: state.live?.report ?? null,
      freshness:
        state.live === null
          ? null
          : freshnessOfFeed(state.live.report, state.live.holidays, settings.deskTimeZone, ports.nowMs()),
      swappedAt: state.swappedAt,
      restatements: state.restatements,
      problem: state.problem,
      problemAt: state.problemAt,
    }),
    look,
    close: () => {
      isClosed = true;
      next?.cancel();
      watcher.close();
    },
  };
};
