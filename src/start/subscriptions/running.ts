import { randomUUID } from 'node:crypto';
import type { Deliver, PlaceState } from '../../digests/ports.ts';
import { createRunner } from '../../digests/run/createRunner.ts';
import { toBlocks } from '../../present/blocks.ts';
import { scheduledReply } from '../../present/compose/scheduled/scheduledReply.ts';
import { toText } from '../../present/text.ts';
import type { Deliveries } from '../../workspaces/deliveries.ts';
import type { ShowPicture } from '../../workspaces/slack/pictures/show.ts';
import type { Terminal } from '../../workspaces/terminal/start.ts';
import { shownPicture } from '../pictures/shown.ts';
import type { Subscriptions } from './deskSubscriptions.ts';
import type { DigestPictures } from './digestPictures.ts';
import { clockTicks, keepRunning } from './loop.ts';

/** Who draws digests for a workspace, and how their pictures are shown there. */
export type PicturesInSlack = { readonly draw: DigestPictures; readonly show: ShowPicture };

/** Posts go the way of every saying: kept, and said once under their key. So does the picture of a digest, in its thread. */
export const deliverInSlack =
  ({ say }: Deliveries, pictures: PicturesInSlack | null = null): Deliver =>
  async ({ post, ...saying }) => {
    const outcome = await say({ ...saying, content: toBlocks(scheduledReply(post)) });
    if (pictures === null || post.kind !== 'digest' || outcome.kind !== 'said') return outcome;
    const picture = await pictures.draw(post);
    if (picture === null) return outcome;
    const content = await pictures.show(shownPicture(picture));
    await say({ ...saying, key: `${saying.key}:picture`, threadTs: outcome.ts, expiresAtMs: null, content });
    return outcome;
  };

/** A terminal shows what is said at once, wherever in its workspace that is. */
export const deliverInTerminal = (terminal: Terminal, draw: DigestPictures | null = null): Deliver => {
  let count = 0;
  return async ({ post, channel, threadTs }) => {
    count += 1;
    const where = threadTs === null ? '' : ', in the thread';
    // what is not asked for has no place among the buttons that a person presses by their number
    const text = toText({ ...scheduledReply(post), buttons: [] }, { width: terminal.width() - 2 });
    const indented = text.replace(/^(?=.)/gm, '  ');
    terminal.write(`\n  posted in ${channel}${where}\n${indented}\n\n`);
    const picture = draw === null || post.kind !== 'digest' ? null : await draw(post);
    if (picture !== null) {
      const saved = await terminal.savePicture(picture);
      terminal.write(`  ${saved.ok ? `Picture: ${saved.value}` : saved.problem.message}\n\n`);
    }
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
  keepRunning(createRunner({ ...ofRun, ...where, holder: randomUUID() }), clockTicks, where.tell);
