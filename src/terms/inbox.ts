import type { InstantMs } from './clock.ts';
import type { MessageContent } from './delivery.ts';

/** Something that a person asked of the bot, as it is kept until it is dealt with. */
export type InboxEvent = {
  /** The same however often it arrives. */
  readonly key: string;
  /** The same before and after an edit; null for what cannot be edited. */
  readonly messageKey: string | null;
  readonly kind: 'question' | 'command' | 'press';
  readonly askedAtMs: InstantMs;
  /** What arrived, as JSON. */
  readonly body: string;
};

/** A message in the workspace with what it says, or is about to say. */
export type PostedContent = {
  readonly channel: string;
  readonly ts: string;
  readonly content: MessageContent;
};

export type KeptEvent = InboxEvent & {
  /** How often somebody began to deal with it. */
  readonly tries: number;
  /** The message that was to be changed into the answer, and may have been; null where none was. */
  readonly editing: PostedContent | null;
  readonly settled: boolean;
};
