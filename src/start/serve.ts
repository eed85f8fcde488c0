import { randomUUID } from 'node:crypto';
import { readTokens, type WorkspaceToStart } from '../config/tokens.ts';
import type { LiveFeed } from '../feed/live/liveFeed.ts';
import { homeReply } from '../present/views/homePage.ts';
import type { Problem } from '../terms/problem.ts';
import { problem } from '../terms/problem.ts';
import { createPermissions } from '../workspaces/access/createPermissions.ts';
import { type Converse, createConverse } from '../workspaces/converse.ts';
import type { Desk } from '../workspaces/desk.ts';
import { everythingAllowed, type Permissions } from '../workspaces/permissions.ts';
import { cardsAtTerminal } from '../workspaces/pins/notes.ts';
import type { Wall } from '../workspaces/pins/ports.ts';
import type { Places } from '../workspaces/slack/places/known.ts';
import { makePlaces } from '../workspaces/slack/places/places.ts';
import type { WhenUnsure } from '../workspaces/slack/settings.ts';
import { terminalTeam } from '../workspaces/subscriptions/managing.ts';
import { createSurfaces, type Surfaces } from '../workspaces/surfaces/surfaces.ts';
import { atTerminal, startTerminal } from '../workspaces/terminal/start.ts';
import { type Arguments, readArguments } from './arguments.ts';
import { computeInPool } from './compute/pool.ts';
import { createDesk } from './desk.ts';
import { exitCodes } from './exit.ts';
import { eventInWords, feedLive } from './feed.ts';
import { startHeartbeat } from './heartbeat.ts';
import { operatorLog, silentLog } from './log.ts';
import { machineTime } from './machineTime.ts';
import { drawInThread } from './pictures/draw.ts';
import { keepTidy, recordsToKeep, versionsOf } from './records/records.ts';
import type { Reopening } from './records/reopening.ts';
import { sitAt } from './session.ts';
import { settingsFor } from './settings.ts';
import { stateOf } from './storeState.ts';
import { createSubscriptions, type Subscriptions } from './subscriptions/deskSubscriptions.ts';
import { createDigestPictures, type DigestPictures } from './subscriptions/digestPictures.ts';
import { deliverInTerminal, runSubscriptions } from './subscriptions/running.ts';
import { thisTerminal } from './terminal.ts';
import { laterWall } from './wall.ts';

const usage =
  'npm start -- [--config FILE] [--feed FILE] [--records FILE] [--workspace auto|slack|terminal] [--record FILE] [--replay FILE]';

const refuseWith = (problems: readonly Pick<Problem, 'message'>[]): number => {
  for (const { message } of problems) process.stderr.write(`${message}\n`);
  return exitCodes.refused;
};

type Serving = {
  readonly converse: Converse;
  readonly surfaces: Surfaces;
  readonly tickers: () => readonly string[];
  readonly records: Reopening;
  readonly permissions: Permissions;
  readonly places: Places;
  readonly whenUnsure: WhenUnsure;
  readonly subscriptions: Subscriptions;
  readonly digestPictures: DigestPictures | null;
  readonly desk: Desk;
  readonly standWall: (wall: Wall) => void;
};

const serveSlack = async (
  workspace: WorkspaceToStart & { kind: 'slack' },
  serving: Serving,
  log: ReturnType<typeof operatorLog>,
): Promise<number> => {
  // The chat library is slow to load; nobody in the terminal should wait for it.
  const { runSlack } = await import('./slack.ts');
  const stopBeating = startHeartbeat(() => stateOf(serving.records), log.warn);
  const problemFound = await runSlack(workspace, serving, log, randomUUID);
  stopBeating();
  return problemFound === null ? exitCodes.answered : refuseWith([problemFound]);
};

const tickersOf = (feed: LiveFeed): readonly string[] => {
  const live = feed.snapshot();
  return live.ok ? live.value.tickers : [];
};

/** A sitting at the terminal is told from every other by so many characters. */
const sittingLength = 8;

const serveTerminal = async (
  { converse, surfaces, subscriptions, permissions, desk, digestPictures }: Serving,
  asked: Arguments,
): Promise<number> => {
  const here = thisTerminal();
  const beside = {
    sitting: randomUUID().slice(0, sittingLength),
    pinned: () => cardsAtTerminal(desk),
    home: async (page: number) =>
      homeReply(await surfaces.home({ place: 'terminal', from: atTerminal }, page - 1, null)),
  };
  const code = await sitAt(here, asked, async (terminal) => {
    const running = runSubscriptions(subscriptions, {
      team: terminalTeam,
      deliver: deliverInTerminal(terminal, digestPictures),
      placeState: permissions.placeVerdict,
      tell: terminal.write,
    });
    await startTerminal(terminal, converse, beside);
    await running.stop();
  });
  here.close();
  return code;
};

const main = async (): Promise<number> => {
  const asked = readArguments(process.argv.slice(2));
  if ('wrong' in asked) return refuseWith([problem('unreadableWords', `${asked.wrong}. Write ${usage}.`)]);
  const reading = settingsFor(asked);
  if (!reading.ok) return refuseWith(reading.problems);
  const { settings } = reading;
  const workspace = readTokens(process.env, settings);
  if (!workspace.ok) return refuseWith([workspace.problem]);
  if (workspace.value.kind === 'slack' && (asked.record !== null || asked.replay !== null))
    return refuseWith([
      { message: 'Sessions are recorded and replayed in the terminal only. Add --workspace terminal.' },
    ]);
  const clock = { nowMs: Date.now };
  const log = workspace.value.kind === 'slack' ? operatorLog() : silentLog;
  const feed = await feedLive(settings, clock, (event) =>
    log[event.kind === 'refused' ? 'error' : 'info'](eventInWords(event)),
  );
  const first = feed.snapshot();
  if (!first.ok) return refuseWith([first.problem]);
  const compute = computeInPool();
  const drawing = drawInThread();
  const store = recordsToKeep(settings, log);
  const stopTidying = keepTidy(store, settings, clock, log.error);
  const records = { store, keeps: true, versions: versionsOf(settings), tell: log.error };
  const places = makePlaces(machineTime, log);
  const permissions =
    workspace.value.kind === 'slack'
      ? createPermissions(settings.permissions, places, clock)
      : everythingAllowed;
  const parts = { settings, clock, snapshot: feed.snapshot, feedStatus: feed.status, compute, records };
  const subscriptions = createSubscriptions({ ...parts, store: store.subscriptions });
  const { wall, stand: standWall } = laterWall();
  const desk = createDesk({ ...parts, permissions, drawing, wall, subscriptions: subscriptions.ofDesk });
  const serving = {
    converse: createConverse(desk),
    surfaces: createSurfaces(desk, settings.slack.listenInThreads),
    tickers: () => tickersOf(feed),
    records: store,
    permissions,
    places,
    whenUnsure: settings.slack.whenUnsure,
    subscriptions,
    digestPictures: settings.digests.picture
      ? createDigestPictures({ drawing, snapshot: feed.snapshot, tell: log.error })
      : null,
    desk,
    standWall,
  };
  try {
    return workspace.value.kind === 'slack'
      ? await serveSlack(workspace.value, serving, log)
      : await serveTerminal(serving, asked);
  } finally {
    stopTidying();
    feed.close();
    await compute.close();
    await drawing.close();
    await store.close();
  }
};

main().then(
  (code) => {
    process.exitCode = code;
  },
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    process.exitCode = exitCodes.broken;
  },
);
