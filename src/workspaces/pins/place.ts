import type { PinPlace } from '../../terms/pins.ts';
import type { Asker } from '../permissions.ts';

/** The discussion that somebody asks in. In a channel one that is not in a thread begins it with its own message. */
export const discussionOf = ({ place, from }: Asker): PinPlace => ({
  team: from.team ?? '',
  channel: from.channel ?? '',
  thread: from.thread ?? (place === 'channel' ? from.message : null),
});
