import { describe, expect, it } from 'vitest';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import type { Saying } from '../../../src/terms/delivery.ts';
import { problem } from '../../../src/terms/problem.ts';
import { refuse } from '../../../src/terms/result.ts';
import type { DurableStore } from '../../../src/workspaces/slack/durable/ports.ts';
import { makeTray } from '../../doubles/platform/tray.ts';
import { accepted } from '../../laws/outcomes.ts';
import { settled, startBot } from './bot.ts';

const sayingOf = (key: string, more: Partial<Saying> = {}): Saying => ({
  key,
  team: 'T0DESK',
  channel: 'C0DESK',
  threadTs: null,
  content: { text: `text of ${key}`, blocks: [] },
  urgent: false,
  expiresAtMs: null,
  ...more,
});

const full = refuse(problem('storeUnavailable', 'The disk is full.'));

/** A store that does nothing while it is told to be full. */
const fillable = async () => {
  const { inbox, deliveries } = accepted(await openSqlite(null));
  let isFull = false;
  const guard =
    <Given extends unknown[], Done>(work: (...given: Given) => Promise<Done>) =>
    async (...given: Given): Promise<Done | typeof full> =>
      isFull ? full : work(...given);
  const store: DurableStore = {
    inbox: {
      keep: guard(inbox.keep),
      willEdit: guard(inbox.willEdit),
      settle: guard(inbox.settle),
      renew: guard(inbox.renew),
      takeOver: guard(inbox.takeOver),
      release: guard(inbox.release),
      ofMessage: guard(inbox.ofMessage),
    },
    deliveries: {
      take: guard(deliveries.take),
      begin: guard(deliveries.begin),
      undone: guard(deliveries.undone),
      settle: guard(deliveries.settle),
      renew: guard(deliveries.renew),
      takeOver: guard(deliveries.takeOver),
      release: guard(deliveries.release),
      find: guard(deliveries.find),
    },
  };
  return {
    store,
    fill: (): void => {
      isFull = true;
    },
    empty: (): void => {
      isFull = false;
    },
  };
};

describe('what nobody waits for', () => {
  it('leaves room for a person’s answer, however much of it there is', async () => {
    const arrivals = makeTray<() => void>('arrivals');
    let holds = false;
    const latency = () => (holds ? new Promise<void>((resolve) => arrivals.add(resolve)) : Promise.resolve());
    const stage = await startBot({ latency });
    const { platform, bot } = stage;
    const channels = Array.from({ length: 200 }, (_, index) =>
      platform.workspace.addChannel({ id: `C0SEA${index}` }),
    );
    holds = true;
    const digests = channels.map(({ id }) => bot.deliveries.say(sayingOf(`digest:${id}`, { channel: id })));
    const underWay: (() => void)[] = [];
    for (let each = 0; each < 4; each += 1) underWay.push(await arrivals.next());
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    holds = false;
    const answer = await platform.posts.next();
    expect(answer).toMatchObject({ text: 'Heard: interval KELP', threadTs: question.ts });
    expect(platform.posts.all).toHaveLength(1);
    for (const goOn of underWay) goOn();
    const outcomes = await Promise.all(digests);
    expect(outcomes.filter(({ kind }) => kind === 'said')).toHaveLength(200);
    expect(platform.posts.all).toHaveLength(201);
    await settled(stage, question);
  });

  it('is not said any more once it is too late', async () => {
    const { platform, bot } = await startBot();
    const expiresAtMs = platform.time.nowMs() - 1;
    expect(await bot.deliveries.say(sayingOf('K', { expiresAtMs }))).toEqual({ kind: 'expired' });
    expect(platform.posts.all).toEqual([]);
    expect(await bot.deliveries.say(sayingOf('K'))).toEqual({ kind: 'expired' });
  });

  it('is refused for good in a channel that is closed to the bot', async () => {
    const { platform, bot } = await startBot();
    const said = await bot.deliveries.say(sayingOf('K', { channel: 'C0OLD' }));
    expect(said).toEqual({ kind: 'refused', code: 'is_archived' });
    expect(await bot.deliveries.say(sayingOf('K'))).toEqual(said);
    expect(platform.posts.all).toEqual([]);
  });

  it('waits for a store in trouble, and is said when it works again', async () => {
    const { store, fill, empty } = await fillable();
    const { platform, bot } = await startBot({ store });
    fill();
    const said = bot.deliveries.say(sayingOf('K'));
    for (let second = 0; second < 60; second += 1) {
      await platform.time.timerSet(1_000);
      platform.time.advance(1_000);
    }
    expect(platform.posts.all).toEqual([]);
    await platform.time.timerSet(1_000);
    empty();
    platform.time.advance(1_000);
    expect((await said).kind).toBe('said');
  });
});

describe('a post whose answer is lost where it cannot be looked for', () => {
  it('is repeated where the settings say so, and the operator is told that it may stand twice', async () => {
    const scopes = ['app_mentions:read', 'chat:write', 'channels:history'];
    const stage = await startBot({ scopes, whenUnsure: 'repeat' });
    const { platform, log } = stage;
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: true });
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await platform.time.timerSet(20_000);
    platform.time.advance(20_000);
    await settled(stage, question);
    expect(platform.posts.all).toHaveLength(2);
    expect(log.map(({ message }) => message).join()).toContain('may stand twice');
  });
});

describe('a store that fails for good', () => {
  it('does not keep a question from its answer: after half a minute it is answered without', async () => {
    const { store, fill } = await fillable();
    const stage = await startBot({ store });
    const { platform } = stage;
    fill();
    for (let round = 0; round < 6; round += 1) {
      await platform.time.timerSet(7_000, 2);
      platform.time.advance(7_000);
    }
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    for (let tried = 0; tried < 3; tried += 1) {
      await platform.time.timerSet(600);
      platform.time.advance(600);
    }
    expect((await platform.posts.next()).text).toBe('Heard: interval KELP');
    await settled(stage, question);
    expect(question.sent[0]?.attempts()).toBe(1);
    expect(stage.asked).toHaveLength(1);
    expect(stage.log.map(({ message }) => message).join()).toContain('the store cannot keep it');
  });

  it('keeps an answer that was worked out no longer than half a minute', async () => {
    const { store, fill, empty } = await fillable();
    const stage = await startBot({
      store,
      conversation: {
        converse: async ({ text }) => {
          fill();
          return [{ text: `Heard: ${text}`, blocks: [], kind: 'answer', private: false }];
        },
      },
    });
    const { platform } = stage;
    const question = platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    await question.sent[0]?.acknowledged;
    for (let second = 0; second < 30; second += 1) {
      await platform.time.timerSet(1_000);
      platform.time.advance(1_000);
    }
    expect((await platform.posts.next()).text).toBe('Heard: interval KELP');
    await platform.time.timerSet(1_000);
    empty();
    platform.time.advance(1_000);
    await settled(stage, question);
    expect(platform.posts.all).toHaveLength(1);
  });
});
