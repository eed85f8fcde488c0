import type { PinPlace } from '../../terms/pins.ts';
import type { Asker } from '../permissions.ts';

/** The team of cards that stand in a terminal. */
export const terminalTeam = '';

/**
 * The discussion that somebody asks in. In a channel one that is not in a thread begins it with its own message; a
 * terminal has nobody who could be disturbed, so its channel is one discussion.
 */
export const discussionOf = ({ place, from }: Asker): PinPlace => ({
  team: from.team ?? terminalTeam,
  channel: from.channel ?? '',
  thread: from.thread ?? (place === 'channel' && from.team !== null ? from.message : null),
});
