import type { Button } from '../../present/reply.ts';

/** A button that was shown, with the number of the message whose thread it stands in. */
export type ShownButton = Button & { readonly thread: number };

/** Where the person at the terminal stands and what can be pressed: the whole memory of a terminal workspace. */
export type Room = {
  readonly channel: string;
  /** The number of the message whose thread is being written in; null at the top of the channel. */
  readonly thread: number | null;
  readonly messageCount: number;
  readonly buttons: readonly ShownButton[];
  /** Where the pictures that were shown are, each as a path or as why there is none. */
  readonly pictures: readonly string[];
};

export const emptyRoom: Room = {
  channel: '#desk',
  thread: null,
  messageCount: 0,
  buttons: [],
  pictures: [],
};

/** What a typed line asks the terminal itself to do. Its words are plain ones: where to go, what to press, what to look at. */
export type Line =
  | { readonly kind: 'nothing' }
  | { readonly kind: 'leave' }
  | { readonly kind: 'channel'; readonly name: string }
  | { readonly kind: 'thread'; readonly number: number | null }
  | { readonly kind: 'pinned' }
  | { readonly kind: 'home'; readonly page: number }
  /** A picture by its number; null: the last one. */
  | { readonly kind: 'see'; readonly number: number | null }
  | { readonly kind: 'press'; readonly number: number }
  | { readonly kind: 'message'; readonly text: string };

const channelPattern = /^([#@][\p{L}\p{N}_-]{1,80})$/u;
const threadPattern = /^thread (\d{1,6})$/i;
const pressPattern = /^press (\d{1,6})$/i;
const homePattern = /^home(?: (\d{1,4}))?$/i;
const seePattern = /^see(?: (\d{1,6}))?$/i;

/** Reads one typed line. Whatever is not one of the terminal's own few words is a message to the bot. */
export const readLine = (line: string): Line => {
  const text = line.trim();
  if (text === '') return { kind: 'nothing' };
  if (/^(leave|quit|exit)$/i.test(text)) return { kind: 'leave' };
  if (/^top$/i.test(text)) return { kind: 'thread', number: null };
  if (/^pinned$/i.test(text)) return { kind: 'pinned' };
  const home = homePattern.exec(text);
  if (home !== null) return { kind: 'home', page: Number(home[1] ?? 1) };
  const seen = seePattern.exec(text);
  if (seen !== null) return { kind: 'see', number: seen[1] === undefined ? null : Number(seen[1]) };
  const channel = channelPattern.exec(text)?.[1];
  if (channel !== undefined) return { kind: 'channel', name: channel };
  const thread = threadPattern.exec(text)?.[1];
  if (thread !== undefined) return { kind: 'thread', number: Number(thread) };
  const pressed = pressPattern.exec(text)?.[1];
  return pressed === undefined ? { kind: 'message', text } : { kind: 'press', number: Number(pressed) };
};

export const promptOf = ({ channel, thread }: Room): string =>
  thread === null ? `${channel}> ` : `${channel} thread ${thread}> `;
