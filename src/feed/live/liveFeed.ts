import type { FeedStatus } from '../../terms/feedReport.ts';
import { type Problem, problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { freshnessOfFeed } from '../freshness.ts';
import type { OpenSnapshot } from '../openFeed.ts';
import { type FileState, signatureOf } from '../priceFiles.ts';
import { emptyState, type FeedState, makeIntake } from './intake.ts';
import type { LiveFeedPorts } from './ports.ts';
import { isDoubtful } from './replacement.ts';

export type { FeedEvent } from './ports.ts';

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
/** A file that may be half a file must stand still for this long before it is taken or told of. */
export const doubtfulRestMs = 10_000;
/** After this long without standing still the desk is told that the file is never whole. */
export const longestUnsettledMs = 60_000;

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
  const state = emptyState();
  const intake = makeIntake(settings.path, ports, state);

  const read = async (files: readonly FileState[], signature: string): Promise<void> => {
    const reading = await ports
      .open(files, ports.nowMs())
      .catch((error: unknown) => brokenReading(settings.path, error));
    if (!reading.ok && reading.problem.code === 'fileChanging') return;
    if (state.live !== null && isDoubtful(state.live, reading, settings.path)) {
      state.held = { signature, reading, sinceMs: ports.nowMs() };
      return;
    }
    state.readSignature = signature;
    state.unsettledSince = null;
    await intake.take(reading);
  };

  const takeHeldIfRested = async (signature: string): Promise<boolean> => {
    const { held } = state;
    if (held === null || ports.nowMs() - held.sinceMs < doubtfulRestMs) return true;
    state.held = null;
    state.readSignature = signature;
    state.unsettledSince = null;
    await intake.take(held.reading);
    return false;
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
    if (signature === state.held?.signature) return takeHeldIfRested(signature);
    state.held = null;
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
  state: FeedState,
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
