import { describe, expect, it } from 'vitest';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import { problem } from '../../../src/terms/problem.ts';
import { refuse } from '../../../src/terms/result.ts';
import type { DurableStore } from '../../../src/workspaces/slack/durable/ports.ts';
import { makeTray } from '../../doubles/platform/tray.ts';
import { accepted } from '../../laws/outcomes.ts';
import { settled, startBot } from './bot.ts';

const full = refuse(problem('storeUnavailable', 'The disk is full.'));

/** A store whose inbox waits for leave, fails so many times first, and notes what it is given. */
const watchedStore = async (leave: () => Promise<void> = async () => {}, failures = 0) => {
  const { deliveries, inbox } = accepted(await openSqlite(null));
  const kept: string[] = [];
  let left = failures;
  const store: DurableStore = {
    deliveries,
    inbox: {
      ...inbox,
      keep: async (event, ...rest) => {
        await leave();
        left -= 1;
        if (left >= 0) return full;
        kept.push(event.body);
        return inbox.keep(event, ...rest);
      },
    },
  };
  return { kept, store };
};

describe.each(['socket', 'http'] as const)('what arrives by %s', (mode) => {
  it('is kept before the platform is told that it arrived', async () => {
    const arrivals = makeTray<() => void>('arrivals');
    const { store } = await watchedStore(() => new Promise<void>((resolve) => arrivals.add(resolve)));
    const stage = await startBot({ mode, store });
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

  it('is kept at the second try where the store is locked for a moment', async () => {
    const { kept, store } = await watchedStore(undefined, 1);
    const stage = await startBot({ mode, store });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await stage.platform.time.timerSet(600);
    stage.platform.time.advance(600);
    await settled(stage, question);
    expect(question.sent.map((sent) => sent.attempts())).toEqual([1]);
    expect(kept).toHaveLength(1);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('is not acknowledged where keeping fails, and is answered when it comes again', async () => {
    const { kept, store } = await watchedStore(undefined, 4);
    const stage = await startBot({ mode, store });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    for (let tried = 0; tried < 3; tried += 1) {
      await stage.platform.time.timerSet(600);
      stage.platform.time.advance(600);
    }
    await stage.bot.idle();
    expect(stage.platform.posts.all).toEqual([]);
    if (mode === 'socket') stage.platform.time.advance(3_000);
    await settled(stage, question);
    expect(question.sent.map((sent) => sent.attempts())).toEqual([2]);
    expect(kept).toHaveLength(1);
    expect(stage.platform.posts.all).toHaveLength(1);
  });

  it('is not kept where it is not meant for the bot', async () => {
    const { kept, store } = await watchedStore();
    const stage = await startBot({ mode, store, subscriptions: ['app_mention', 'message.channels'] });
    const talk = stage.platform.say({ channel: 'C0DESK', text: 'between us' });
    expect(talk.sent).toHaveLength(1);
    await settled(stage, talk);
    expect(kept).toEqual([]);
  });
});

describe('what is kept', () => {
  it('holds no token of the platform', async () => {
    const { kept, store } = await watchedStore();
    const stage = await startBot({ store });
    await settled(stage, stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP' }));
    expect(kept[0]).toContain('interval KELP');
    expect(kept[0]).not.toContain('verification');
  });
});
