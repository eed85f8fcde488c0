import { toBlocks } from '../present/blocks.ts';
import type { Deliveries } from '../workspaces/deliveries.ts';
import type { Wall } from '../workspaces/pins/ports.ts';
import type { PinBoard } from '../workspaces/slack/pinBoard.ts';

/** Cards go the way of every saying: kept, and said once under their key. */
export const wallIn = ({ say }: Deliveries, { pin, unpin }: PinBoard): Wall => ({
  say: (key, { team, channel, thread }, content) =>
    say({
      key,
      team,
      channel,
      threadTs: thread,
      content: toBlocks(content),
      urgent: true,
      expiresAtMs: null,
    }),
  pin,
  unpin,
});

/** A wall that stands only once the workspace has been joined. */
export const laterWall = () => {
  let wall: Wall | null = null;
  return {
    wall: (): Wall | null => wall,
    stand: (found: Wall): void => {
      wall = found;
    },
  };
};
