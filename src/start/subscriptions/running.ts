import { randomUUID } from 'node:crypto';
import type { Deliver, PlaceState } from '../../digests/ports.ts';
import { createRunner } from '../../digests/run/createRunner.ts';
import { toBlocks } from '../../present/blocks.ts';
import { scheduledReply } from '../../present/compose/scheduled/scheduledReply.ts';
import { toText } from '../../present/text.ts';
import type { Deliveries } from '../../workspaces/deliveries.ts';
import type { Terminal } from '../../workspaces/terminal/start.ts';
import { machineTime } from '../machineTime.ts';
import type { Subscriptions } from './deskSubscriptions.ts';
import { keepRunning } from './loop.ts';

/** Posts go the way of every saying: kept, and said once under their key. */
export const deliverInSlack =
  ({ say }: Deliveries): Deliver =>
  ({ post, ...saying }) =>
    say({ ...saying, content: toBlocks(scheduledReply(post)) });

/** A terminal shows what is said at once, wherever in its workspace that is. */
export const deliverInTerminal = (terminal: Terminal): Deliver => {
  let count = 0;
  return async ({ post, channel, threadTs }) => {
    count += 1;
    const where = threadTs === null ? '' : ', in the thread';
    // what is not asked for has no place among the buttons that a person presses by their number
    const text = toText({ ...scheduledReply(post), buttons: [] }, { width: terminal.width() - 2 });
    const indented = text.replace(/^(?=.)/gm, '  ');
    terminal.write(`\n  posted in ${channel}${where}\n${indented}\n\n`);
    return { kind: 'said', ts: String(count) };
  };
};

/** Whose digests and watches are run, and where they speak. */
export type RunningWhere = {
  readonly team: string;
  readonly deliver: Deliver;
  readonly placeState: PlaceState;
  readonly tell: (message: string) => void;
};

/** Runs what falls due in one workspace until it is stopped. */
export const runSubscriptions = ({ ofRun }: Subscriptions, where: RunningWhere) =>
  keepRunning(createRunner({ ...ofRun, ...where, holder: randomUUID() }), machineTime);
