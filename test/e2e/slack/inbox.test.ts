import { describe, expect, it } from 'vitest';
import type { Inbox, Received } from '../../../src/workspaces/slack/ports.ts';
import { makeTray } from '../../doubles/platform/tray.ts';
import { settled, startBot } from './bot.ts';

/** An inbox that notes what it is given and fails as often as it is told to. */
const noting = (failures = 0) => {
  const kept: Received[] = [];
  let left = failures;
  const inbox: Inbox = {
    keep: (received) => {
      if (left > 0) {
        left -= 1;
        return Promise.reject(new Error('disk full'));
      }
      kept.push(received);
      return Promise.resolve();
    },
  };
  return { kept, inbox };
};

describe.each(['socket', 'http'] as const)('what arrives by %s', (mode) => {
  it('is kept before the platform is told that it arrived', async () => {
    const arrivals = makeTray<() => void>('arrivals');
    const keep = () => new Promise<void>((resolve) => arrivals.add(resolve));
    const stage = await startBot({ mode, inbox: { keep } });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    let acknowledged = false;
    question.sent[0]?.acknowledged.then(() => {
      acknowledged = true;
    });
    const letKeep = await arrivals.next();
    expect(acknowledged).toBe(false);
    letKeep();
    await settled(stage, question);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('is not acknowledged where keeping fails, and is answered when it comes again', async () => {
    const { kept, inbox } = noting(1);
    const stage = await startBot({ mode, inbox });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    if (mode === 'socket') {
      await stage.bot.idle();
      stage.platform.time.advance(3_000);
    }
    await settled(stage, question);
    expect(question.sent.map((sent) => sent.attempts())).toEqual([2]);
    expect(kept).toMatchObject([{ retryNumber: 1, body: { event: { type: 'app_mention' } } }]);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('is not kept where it is not meant for the bot', async () => {
    const { kept, inbox } = noting();
    const stage = await startBot({ mode, inbox, subscriptions: ['app_mention', 'message.channels'] });
    const talk = stage.platform.say({ channel: 'C0DESK', text: 'between us' });
    expect(talk.sent).toHaveLength(1);
    await settled(stage, talk);
    expect(kept).toEqual([]);
  });
});
