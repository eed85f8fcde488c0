import type { InstantMs } from '../../../terms/clock.ts';
import { localTimeAt } from '../../../terms/zonedTime.ts';
import { counted, instantInWords, weekdayInWords } from '../../../wording/words.ts';
import { type Reply, reply } from '../../reply.ts';

/** A digest or a watch as it is listed. `asks` is what would make it anew. */
export type SubscriptionInWords = {
  readonly id: string;
  readonly kind: 'digest' | 'watch';
  readonly state: 'active' | 'paused' | 'stopped';
  readonly pausedWhy: 'person' | 'place' | null;
  readonly asks: string;
  readonly nextDueMs: InstantMs | null;
  readonly timeZone: string | null;
};

/** `Wednesday 2026-12-02 08:30 Europe/London`. */
export const nextInWords = ({ nextDueMs, timeZone }: SubscriptionInWords): string =>
  nextDueMs === null || timeZone === null
    ? 'nothing is planned'
    : `${weekdayInWords(localTimeAt(nextDueMs, timeZone).day)} ${instantInWords(nextDueMs, timeZone)}`;

const noHolidays = 'No holidays are known here, so every weekday counts as a session.';

const cautions = (weekdaysAssumed: boolean): readonly string[] => (weekdaysAssumed ? [noHolidays] : []);

const withCare = (
  sentence: string,
  passages: readonly string[],
  weekdaysAssumed: boolean,
  quietLine: string | null = null,
): Reply =>
  reply('record', sentence, {
    passages: [...passages, ...cautions(weekdaysAssumed)].map((line) => ({ head: null, lines: [line] })),
    quietLine,
  });

const assumedInWords = (assumed: readonly string[]): string | null =>
  assumed.length === 0 ? null : `Assumed: ${assumed.join(', ')}`;

/** What was made, and when it speaks first. */
export const madeReply = (
  made: SubscriptionInWords,
  more: {
    readonly seesNow: string | null;
    readonly assumed: readonly string[];
    readonly weekdaysAssumed: boolean;
  },
): Reply => {
  const first =
    made.kind === 'digest'
      ? `Next post: ${nextInWords(made)}.`
      : 'It looks once at each new session of prices, and speaks here.';
  return withCare(
    `${made.id} is made. ${first}`,
    [made.asks, ...(more.seesNow === null ? [] : [more.seesNow])],
    more.weekdaysAssumed,
    assumedInWords(more.assumed),
  );
};

const doneWords = { pause: 'paused', resume: 'going on', stop: 'stopped', change: 'changed' } as const;

/** What has become of one that exists. */
export const doneReply = (
  subscription: SubscriptionInWords,
  done: keyof typeof doneWords,
  weekdaysAssumed: boolean,
): Reply => {
  const { id, kind, state, asks } = subscription;
  const next = kind === 'digest' && state === 'active' ? ` Next post: ${nextInWords(subscription)}.` : '';
  const how =
    done === 'pause'
      ? ` ${kind} resume ${id} takes it up.`
      : done === 'stop'
        ? ' Its id is not used again.'
        : '';
  const shown = done === 'change' || done === 'resume' ? [asks] : [];
  return withCare(`${id} is ${doneWords[done]}.${next}${how}`, shown, weekdaysAssumed && next !== '');
};

const stateInWords = ({ state, pausedWhy }: SubscriptionInWords): string => {
  if (state !== 'paused') return state;
  return pausedWhy === 'place' ? 'paused, its place cannot be posted to' : 'paused';
};

const lineOf = (subscription: SubscriptionInWords): string => {
  const next = subscription.nextDueMs === null ? '' : `; next ${nextInWords(subscription)}`;
  return `${subscription.id} (${stateInWords(subscription)}): ${subscription.asks}${next}`;
};

const mostListed = 20;

/** What is there in this place, and what else the asker owns. */
export const subscriptionsReply = (
  kind: 'digest' | 'watch',
  here: readonly SubscriptionInWords[],
  elsewhere: readonly SubscriptionInWords[],
  weekdaysAssumed: boolean,
): Reply => {
  const plural = kind === 'digest' ? 'digests' : 'watches';
  const listed = (head: string, all: readonly SubscriptionInWords[]) => {
    const more = all.length - mostListed;
    const lines = [...all.slice(0, mostListed).map(lineOf), ...(more > 0 ? [`and ${more} more`] : [])];
    return all.length === 0 ? [] : [{ head, lines }];
  };
  const counts = `${counted(here.length, kind, plural)} here${elsewhere.length === 0 ? '' : `, ${elsewhere.length} of yours elsewhere`}`;
  return reply('record', `${counts}.`, {
    passages: [
      ...listed('Here', here),
      ...listed('Yours elsewhere', elsewhere),
      ...cautions(weekdaysAssumed && here.length + elsewhere.length > 0).map((line) => ({
        head: null,
        lines: [line],
      })),
    ],
  });
};
