import { afterEach } from 'vitest';
import { openSqlite } from '../../../src/records/openSqlite.ts';
import type { News } from '../../../src/workspaces/news.ts';
import type { DurableStore } from '../../../src/workspaces/slack/durable/ports.ts';
import type { Places } from '../../../src/workspaces/slack/places/known.ts';
import { makePlaces } from '../../../src/workspaces/slack/places/places.ts';
import type { Asking, Block, Conversation, Press, SpokenReply } from '../../../src/workspaces/slack/ports.ts';
import { seenInMemory } from '../../../src/workspaces/slack/seen.ts';
import type { Receiving, WhenUnsure } from '../../../src/workspaces/slack/settings.ts';
import { type SlackWorkspace, startSlack } from '../../../src/workspaces/slack/start.ts';
import { type Platform, type PlatformOptions, startPlatform } from '../../doubles/platform/start.ts';
import { makeTray } from '../../doubles/platform/tray.ts';
import { accepted } from '../../laws/outcomes.ts';

type Section = Block & { readonly text: object };
const section = (text: string): Section => ({
  type: 'section',
  text: { type: 'plain_text', text, emoji: false },
});

export const spoken = (text: string, parts: Partial<SpokenReply> = {}): SpokenReply => ({
  text,
  blocks: [section(text)],
  kind: 'answer',
  private: false,
  ...parts,
});

/** Says every question back with a button below, and refuses, privately, what begins with "refuse". */
export const echo: Conversation = {
  converse: ({ text }) => {
    const buttons = {
      type: 'actions',
      elements: [
        {
          type: 'button',
          action_id: 'working',
          text: { type: 'plain_text', text: 'Show the working', emoji: false },
          value: text,
        },
      ],
    } as const;
    const answer = spoken(`Heard: ${text}`);
    const refusal = spoken(`Refused: ${text}`, { kind: 'refusal', private: true, blocks: [] });
    return Promise.resolve([
      text.startsWith('refuse') ? refusal : { ...answer, blocks: [...answer.blocks, buttons] },
    ]);
  },
  press: ({ value }) => Promise.resolve([spoken(`Working of: ${value}`)]),
  ready: async () => {},
  examples: async () => [spoken('Try: interval KELP 60d', { kind: 'help' })],
  overhear: null,
  form: {
    view: () => ({
      type: 'modal',
      callback_id: 'ask',
      title: { type: 'plain_text', text: 'Ask', emoji: false },
      blocks: [section('A form.')],
    }),
    tickers: () => [],
    read: () => ({ ok: true, question: 'interval KELP 60d' }),
  },
  home: async () => ({ type: 'home', callback_id: 'home', blocks: [section('Home.')] }),
};

/** Answers each question only when the test says so. */
export const answeringLater = () => {
  const questions = makeTray<Asking & { readonly answer: (...replies: readonly SpokenReply[]) => void }>(
    'questions',
  );
  const conversation: Conversation = {
    ...echo,
    converse: (asking) =>
      new Promise((resolve) => questions.add({ ...asking, answer: (...replies) => resolve(replies) })),
  };
  return { questions, conversation };
};

export type LogLine = { readonly level: 'info' | 'warn' | 'error'; readonly message: string };

export type BotOptions = PlatformOptions & {
  /** It will not be stopped: its store dies under it. */
  readonly dies?: boolean;
  readonly conversation?: Partial<Conversation>;
  readonly mode?: Receiving['mode'];
  readonly store?: DurableStore;
  readonly whenUnsure?: WhenUnsure;
  readonly places?: Places;
  readonly onNews?: (news: News) => Promise<void>;
};

export type Stage = {
  readonly platform: Platform;
  readonly bot: SlackWorkspace;
  readonly log: readonly LogLine[];
  /** What the bot was asked and pressed. */
  readonly asked: readonly Asking[];
  readonly pressed: readonly Press[];
  /** Where requests go in HTTP mode. */
  readonly url: string;
};

const running: { readonly stop: () => Promise<void> }[] = [];

afterEach(async () => {
  for (const each of running.splice(0).reverse()) await each.stop();
});

let holders = 0;
const newHolder = (): string => {
  holders += 1;
  return `holder-${holders}`;
};

const logInto = (lines: LogLine[]) => ({
  info: (message: string) => void lines.push({ level: 'info', message }),
  warn: (message: string) => void lines.push({ level: 'warn', message }),
  error: (message: string) => void lines.push({ level: 'error', message }),
});

/** Everything but the conversation is real: the chat library, its client, sockets and requests on loopback. */
export const prepare = async (options: BotOptions = {}) => {
  const platform = await startPlatform(options);
  running.push(platform);
  return prepareOn(platform, options);
};

const prepareOn = async (platform: Platform, options: BotOptions) => {
  const store = options.store ?? accepted(await openSqlite(null));
  const { whenUnsure = 'leave' } = options;
  const log: LogLine[] = [];
  const asked: Asking[] = [];
  const pressed: Press[] = [];
  const inner: Conversation = { ...echo, ...options.conversation };
  const conversation: Conversation = {
    ...inner,
    converse: (asking) => {
      asked.push(asking);
      return inner.converse(asking);
    },
    press: (press) => {
      pressed.push(press);
      return inner.press(press);
    },
  };
  const receiving: Receiving =
    options.mode === 'http'
      ? { mode: 'http', signingSecret: platform.signingSecret, host: '127.0.0.1', port: 0 }
      : { mode: 'socket', appToken: platform.appToken, sockets: 2 };
  const start = (settings: { readonly botToken?: string; readonly receiving?: Receiving } = {}) =>
    startSlack(
      { botToken: platform.botToken, receiving, apiUrl: platform.apiUrl, whenUnsure, ...settings },
      {
        conversation,
        log: logInto(log),
        time: platform.time,
        newId: newHolder,
        seen: seenInMemory(),
        store,
        places: options.places ?? makePlaces(platform.time, logInto(log)),
        onNews: options.onNews ?? (async () => {}),
      },
    );
  return { platform, log, asked, pressed, start };
};

const startPrepared = async (
  { start, ...stage }: Awaited<ReturnType<typeof prepareOn>>,
  options: BotOptions,
): Promise<Stage> => {
  const started = await start();
  if (!started.ok) throw new Error(started.problem.message);
  const bot = started.value;
  if (options.dies !== true) running.push(bot);
  const url = `http://127.0.0.1:${bot.port ?? 0}/slack/events`;
  if (options.mode === 'http') stage.platform.sendTo(url);
  return { ...stage, bot, url };
};

export const startBot = async (options: BotOptions = {}): Promise<Stage> => {
  const stage = await startPrepared(await prepare(options), options);
  if (options.mode !== 'http') await stage.platform.sockets.connected(2);
  return stage;
};

/** One more bot in a workspace that has some. */
export const startBotOn = async (platform: Platform, options: BotOptions): Promise<Stage> =>
  startPrepared(await prepareOn(platform, options), options);

/** Everything that was sent has arrived and is dealt with. */
export const settled = async (
  { bot }: Stage,
  ...things: readonly { readonly sent: readonly { readonly acknowledged: Promise<unknown> }[] }[]
): Promise<void> => {
  await Promise.all(things.flatMap(({ sent }) => sent.map(({ acknowledged }) => acknowledged)));
  await bot.idle();
};
