import { expect, it } from 'vitest';
import { answerCommand } from '../../../src/workspaces/slack/command.ts';
import type { Press, SpokenReply } from '../../../src/workspaces/slack/ports.ts';
import type { Voice } from '../../../src/workspaces/slack/post.ts';
import { answerPress } from '../../../src/workspaces/slack/press.ts';
import { recentPresses } from '../../../src/workspaces/slack/recent.ts';
import { seenInMemory } from '../../../src/workspaces/slack/seen.ts';
import { notedDeliveries } from '../../doubles/deliveries.ts';
import { manualTime } from '../../doubles/time.ts';

const said: SpokenReply = { text: 'so', blocks: [], kind: 'answer', private: false };

const setUp = () => {
  const presses: Press[] = [];
  const heard: string[] = [];
  const posts: string[] = [];
  const log: string[] = [];
  const note = (message: string) => void log.push(message);
  const { said: sayings, ...spoken } = notedDeliveries();
  const voice: Voice = {
    whisper: () => Promise.resolve(),
    update: () => Promise.resolve(),
    updateNow: () => Promise.resolve(true),
    remove: () => Promise.resolve(),
  };
  const time = manualTime();
  return {
    ...spoken,
    recent: recentPresses(time),
    presses,
    heard,
    posts: () => [...posts, ...sayings.map(({ channel, threadTs }) => `${channel} ${threadTs}`)],
    log: { info: note, warn: note, error: note },
    logged: log,
    voice,
    showPicture: async () => said,
    time,
    seen: seenInMemory(),
    respond: (url: string) => {
      posts.push(url);
      return Promise.resolve();
    },
    conversation: {
      converse: ({ text }: { readonly text: string }) => {
        heard.push(text);
        return Promise.resolve([said]);
      },
      press: (press: Press) => {
        presses.push(press);
        return Promise.resolve([said]);
      },
      ready: async () => {},
      examples: async () => [said],
    },
  };
};

const press = (action: object, more: object = {}) => ({
  user: { id: 'U1' },
  container: { message_ts: '5.000001', channel_id: 'C1' },
  response_url: 'https://platform.example.com/respond/1',
  actions: [{ action_id: 'working', action_ts: '6.0', ...action }],
  ...more,
});

it('the same press delivered twice is answered once, a second press after a while again', async () => {
  const desk = setUp();
  await answerPress(desk, press({ value: 'v' }));
  await answerPress(desk, press({ value: 'v' }));
  desk.time.advance(60_000);
  await answerPress(desk, press({ value: 'v', action_ts: '7.0' }));
  expect(desk.posts()).toEqual(['C1 5.000001', 'C1 5.000001']);
});

it('however often and by whomever a button is pressed within a minute, it is answered once', async () => {
  const desk = setUp();
  await answerPress(desk, press({ value: 'v' }));
  desk.time.advance(59_999);
  await answerPress(desk, press({ value: 'v', action_ts: '7.0' }, { user: { id: 'U2' } }));
  await answerPress(desk, press({ value: 'v', action_ts: '8.0', action_id: 'more' }));
  expect(desk.presses.map(({ actionId }) => actionId)).toEqual(['working', 'more']);
});

it('a press of which others saw nothing does not stand in the way of theirs', async () => {
  const desk = setUp();
  const refusal: SpokenReply = { ...said, kind: 'refusal', private: true };
  const barred = { ...desk, conversation: { ...desk.conversation, press: async () => [refusal] } };
  await answerPress(barred, press({ value: 'v' }));
  await answerPress(desk, press({ value: 'v', action_ts: '7.0' }, { user: { id: 'U2' } }));
  expect(desk.presses).toHaveLength(1);
});

it('a chosen line of a menu counts as its value', async () => {
  const desk = setUp();
  await answerPress(desk, press({ selected_option: { value: 'second' } }));
  expect(desk.presses).toMatchObject([
    { actionId: 'working', value: 'second', place: 'channel', from: { person: 'U1', message: '5.000001' } },
  ]);
});

it('a press in a form, which has no message, is left alone', async () => {
  const desk = setUp();
  await answerPress(desk, press({}, { container: { view_id: 'V1' } }));
  expect([desk.presses, desk.logged]).toEqual([[], []]);
});

it('the same command delivered twice is answered once', async () => {
  const desk = setUp();
  const command = { team_id: 'T1', text: 'feed', response_url: 'https://x.example.com', trigger_id: 'X1' };
  await answerCommand(desk, command);
  await answerCommand(desk, command);
  expect(desk.heard).toEqual(['feed']);
});

it('a command in a form that cannot be read is an operator error', async () => {
  const desk = setUp();
  await answerCommand(desk, { text: 'feed' });
  expect(desk.logged).toHaveLength(1);
});
