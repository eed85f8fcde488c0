import type { OwnerNote } from '../../../terms/scheduledPosts.ts';
import { type Reply, reply } from '../../reply.ts';

const reasons: Readonly<Record<string, string>> = {
  archived: 'its channel is archived',
  notMember: 'I am not a member of its channel',
  gone: 'its channel is gone or cannot be seen by me',
  restricted: 'I am not allowed to post there',
  ownerLeft: 'its owner has left the workspace',
  shared: 'its channel is shared with another company now',
  guests: 'guests can read its channel now',
};

/** What the owner of a digest or a watch is told once, in private. */
export const ownerNoteReply = ({ id, what, why, subject }: OwnerNote): Reply => {
  const reason = reasons[why] ?? `the platform says ${why}`;
  const then =
    what === 'paused'
      ? `It goes on by itself once it can be posted again; ${subject} stop ${id} ends it.`
      : `It does not go on by itself. Make it anew where it may be read.`;
  return reply('record', `${id} is ${what}: ${reason}. ${then}`);
};
