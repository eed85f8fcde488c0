import type { WorkspaceToStart } from '../config/tokens.ts';
import { lookAgain } from '../digests/run/lookAgain.ts';
import type { Problem } from '../terms/problem.ts';
import type { Converse } from '../workspaces/converse.ts';
import type { News } from '../workspaces/news.ts';
import type { Permissions } from '../workspaces/permissions.ts';
import type { Wall } from '../workspaces/pins/ports.ts';
import type { DurableStore } from '../workspaces/slack/durable/ports.ts';
import type { Places } from '../workspaces/slack/places/known.ts';
import type { Logger } from '../workspaces/slack/ports.ts';
import { seenInMemory } from '../workspaces/slack/seen.ts';
import type { SlackSettings, WhenUnsure } from '../workspaces/slack/settings.ts';
import { startSlack } from '../workspaces/slack/start.ts';
import type { Surfaces } from '../workspaces/surfaces/surfaces.ts';
import { machineTime } from './machineTime.ts';
import { slackConversation } from './slackConversation.ts';
import type { Subscriptions } from './subscriptions/deskSubscriptions.ts';
import type { DigestPictures } from './subscriptions/digestPictures.ts';
import { deliverInSlack, runSubscriptions } from './subscriptions/running.ts';
import { type TendingParts, tendWorkspace } from './tending.ts';
import { wallIn } from './wall.ts';

/** Two sockets, so that one can be opened anew while the other hears. */
const sockets = 2;

const settingsOf = (workspace: WorkspaceToStart & { kind: 'slack' }): Omit<SlackSettings, 'whenUnsure'> => ({
  botToken: workspace.botToken.reveal(),
  apiUrl: workspace.apiUrl,
  receiving:
    workspace.connection === 'socket'
      ? { mode: 'socket', appToken: workspace.appToken.reveal(), sockets }
      : {
          mode: 'http',
          signingSecret: workspace.signingSecret.reveal(),
          host: '0.0.0.0',
          port: workspace.port,
        },
});

const untilTold = (): Promise<string> =>
  new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => resolve(signal));
  });

/** What the bot is in Slack. */
export type InSlack = {
  readonly converse: Converse;
  readonly tickers: () => readonly string[];
  readonly surfaces: Surfaces;
  readonly permissions: Permissions;
  readonly places: Places;
  readonly records: DurableStore & TendingParts['store'];
  readonly desk: TendingParts['desk'];
  readonly standWall: (wall: Wall) => void;
  readonly whenUnsure: WhenUnsure;
  readonly subscriptions: Subscriptions;
  /** null where digests go without a picture. */
  readonly digestPictures: DigestPictures | null;
};

/** Answers in Slack until the process is told to stop; the problem where it could not begin. */
export const runSlack = async (
  workspace: WorkspaceToStart & { kind: 'slack' },
  serving: InSlack,
  log: Logger,
  newId: () => string,
): Promise<Problem | null> => {
  const { converse, tickers, surfaces, permissions, places, records, whenUnsure, subscriptions } = serving;
  const { digestPictures: draw } = serving;
  let hear: (news: News) => Promise<void> = async () => {};
  const started = await startSlack(
    { ...settingsOf(workspace), whenUnsure },
    {
      conversation: slackConversation(converse, tickers, surfaces, permissions),
      log,
      time: machineTime,
      newId,
      seen: seenInMemory(),
      store: records,
      places,
      onNews: (news) => hear(news),
    },
  );
  if (!started.ok) return started.problem;
  const { port, team, deliveries, showPicture, pinBoard } = started.value;
  const where = {
    team,
    deliver: deliverInSlack(deliveries, draw === null ? null : { draw, show: showPicture }),
    placeState: permissions.placeVerdict,
    tell: log.error,
  };
  serving.standWall(wallIn(deliveries, pinBoard));
  const tending = tendWorkspace({
    desk: serving.desk,
    store: records,
    places,
    lookAgain: (touched) => lookAgain({ ...where, store: subscriptions.ofRun.store }, touched),
    time: machineTime,
    tell: log.error,
  });
  ({ hear } = tending);
  const running = runSubscriptions(subscriptions, where);
  log.info(port === null ? 'answering in Slack over sockets' : `answering in Slack on port ${port}`);
  const signal = await untilTold();
  log.info(`stopping on ${signal}: finishing what is under way`);
  await running.stop();
  await tending.stop();
  await started.value.stop();
  return null;
};
