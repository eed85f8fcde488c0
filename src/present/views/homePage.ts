import type { InstantMs } from '../../terms/clock.ts';
import { counted, instantInWords } from '../../wording/words.ts';
import { nextInWords, type SubscriptionInWords } from '../compose/scheduled/subscriptions.ts';
import { platformLimits as limits } from '../limits/platformLimits.ts';
import { type Button, type Passage, type Reply, reply } from '../reply.ts';
import { header, options, quiet, section, type View, words } from './parts.ts';

export const homeId = 'home';

/** So many digests and watches stand on one page. */
export const subscriptionsPerPage = 20;

export type RecentAnswer = { readonly id: string; readonly question: string; readonly askedAtMs: InstantMs };

/** What one person sees at home. */
export type HomePage = {
  /** What is said instead of all the rest to who is not answered here. */
  readonly barred: string | null;
  /** How the prices stand, in a sentence. */
  readonly feed: string;
  readonly stale: string | null;
  /** Those of this page. */
  readonly subscriptions: readonly SubscriptionInWords[];
  readonly subscriptionCount: number;
  /** Counted from 0. */
  readonly page: number;
  readonly recent: readonly RecentAnswer[];
  /** Why something is missing here, where it is. */
  readonly troubles: readonly string[];
  readonly examples: readonly string[];
  readonly timeZone: string;
  /** What came of the last press. */
  readonly note: string | null;
};

const titles = {
  feed: 'Prices',
  subscriptions: 'Your digests and watches',
  recent: 'What you asked last',
  ask: 'How to ask',
};

const askLine =
  'Mention the bot in a channel, write to it directly, type /leadsman for an answer of your own, or use its shortcuts.';

const stateInWords = ({ state, pausedWhy }: SubscriptionInWords): string => {
  if (state !== 'paused') return state;
  return pausedWhy === 'place' ? 'paused, since its place cannot be posted to' : 'paused';
};

const rowInWords = (each: SubscriptionInWords): string =>
  `${each.id}, ${stateInWords(each)}: ${each.asks}${each.kind === 'digest' && each.state === 'active' ? `. Next: ${nextInWords(each)}` : ''}`;

const none = 'None. “digest KELP 08:30” makes a digest, “watch KELP tail 99% above 4%” a watch.';
const nothingAsked = 'Nothing that is on record.';

const recentInWords = ({ recent, timeZone }: HomePage): readonly string[] =>
  recent.map(({ id, question, askedAtMs }) => `${instantInWords(askedAtMs, timeZone)}  ${id}  ${question}`);

const pageCount = ({ subscriptionCount }: HomePage): number =>
  Math.max(1, Math.ceil(subscriptionCount / subscriptionsPerPage));

const pageInWords = (page: HomePage): string =>
  `${counted(page.subscriptionCount, 'digest or watch', 'digests and watches')}; page ${page.page + 1} of ${pageCount(page)}`;

type Change = Pick<Button, 'action' | 'label'>;

/** What a person can do with one, in the words of its menu. */
const changesOf = ({ state }: SubscriptionInWords): readonly Change[] => [
  state === 'paused'
    ? { action: 'resumeSubscription', label: 'Resume' }
    : { action: 'pauseSubscription', label: 'Pause' },
  { action: 'stopSubscription', label: 'Stop for good' },
];

/** What an option of the menu carries: short, since the platform takes no more. */
export const changeValue = (action: string, id: string): string => JSON.stringify({ action, id });

const row = (each: SubscriptionInWords) =>
  section(rowInWords(each), {
    accessory: {
      type: 'overflow',
      action_id: 'subscription',
      options: options(
        changesOf(each).map(({ action, label }) => ({ text: label, value: changeValue(action, each.id) })),
        limits.overflow.options,
      ),
    },
  });

const turn = (label: string, page: number) => ({
  type: 'button',
  action_id: `page.${page}`,
  text: words(label, limits.button.text),
  value: String(page),
});

const turns = (page: HomePage): readonly object[] => {
  if (pageCount(page) === 1) return [];
  const buttons = [
    ...(page.page > 0 ? [turn('Page before', page.page - 1)] : []),
    ...(page.page + 1 < pageCount(page) ? [turn('Next page', page.page + 1)] : []),
  ];
  return [quiet(pageInWords(page)), { type: 'actions', elements: buttons }];
};

const lines = (all: readonly string[], otherwise: string) =>
  section(all.length === 0 ? otherwise : all.join('\n'));

const homeBlocks = (page: HomePage): readonly object[] => [
  ...(page.note === null ? [] : [section(page.note), { type: 'divider' }]),
  header(titles.feed),
  section(page.stale === null ? page.feed : `${page.feed}\nCaution: ${page.stale}`),
  header(titles.subscriptions),
  ...(page.subscriptions.length === 0 ? [section(none)] : page.subscriptions.map(row)),
  ...turns(page),
  header(titles.recent),
  lines(recentInWords(page), nothingAsked),
  header(titles.ask),
  section([askLine, ...page.examples].join('\n')),
  ...page.troubles.map((trouble) => quiet(trouble)),
];

/** The home page as a view of the workspace: one section with a menu for each digest or watch. */
export const homeView = (page: HomePage): View => ({
  type: 'home',
  callback_id: homeId,
  private_metadata: String(page.page),
  blocks: page.barred === null ? homeBlocks(page) : [section(page.barred)],
});

const passagesOf = (page: HomePage): readonly Passage[] => [
  {
    head: titles.subscriptions,
    lines: [
      ...(page.subscriptions.length === 0 ? [none] : page.subscriptions.map(rowInWords)),
      ...(pageCount(page) === 1 ? [] : [`${pageInWords(page)}; home ${page.page + 2} shows the next`]),
    ],
  },
  { head: titles.recent, lines: page.recent.length === 0 ? [nothingAsked] : recentInWords(page) },
  { head: titles.ask, lines: page.examples },
  ...(page.troubles.length === 0 ? [] : [{ head: 'Missing here', lines: page.troubles }]),
];

/** The home page as a reply, for a place without one: its menus are buttons. */
export const homeReply = (page: HomePage): Reply =>
  page.barred === null ? openReply(page) : reply('refusal', page.barred);

const openReply = (page: HomePage): Reply =>
  reply('help', page.note ?? page.feed, {
    passages: [
      ...(page.note === null ? [] : [{ head: titles.feed, lines: [page.feed] }]),
      ...passagesOf(page),
    ],
    warnings: page.stale === null ? [] : [page.stale],
    buttons: page.subscriptions.flatMap((each) =>
      changesOf(each).map(({ action, label }) => ({
        action,
        label: `${label}: ${each.id}`,
        answerId: each.id,
        question: '',
      })),
    ),
  });
