import type { View } from '../../present/views/parts.ts';
import type { Clock } from '../../terms/clock.ts';
import type { PostedContent } from '../../terms/inbox.ts';
import type { AskedFrom } from '../../terms/records.ts';
import type { News } from '../news.ts';
import type { AskForm } from '../surfaces/askForm.ts';
import type { DurableStore } from './durable/ports.ts';
import type { Places } from './places/known.ts';

/** Where a question was asked. */
export type AskedWhere = 'channel' | 'direct' | 'command' | 'terminal';

export type Asking = {
  /** What was typed, as the platform wrote it out, without the mention of the bot itself. */
  readonly text: string;
  readonly place: AskedWhere;
  readonly from: AskedFrom;
  /** Says how far a slow answer has come, in words that need no escaping. */
  readonly progress?: (words: string) => void;
};

/** A block of the platform's layout, rendered and checked elsewhere. */
export type Block = { readonly type: string };

/** A picture to be shown below a reply, and the messages that do so or say it in words. */
export type ShownPicture = {
  readonly png: Uint8Array;
  readonly fileName: string;
  readonly title: string;
  readonly altText: string;
  readonly withFile: (fileId: string) => { readonly text: string; readonly blocks: readonly Block[] };
  readonly inWords: (why: string) => { readonly text: string; readonly blocks: readonly Block[] };
};

export type SpokenReply = {
  /** All that screen readers and notifications get; escaped. */
  readonly text: string;
  /** Empty for a reply of text alone. */
  readonly blocks: readonly Block[];
  readonly kind: 'answer' | 'refusal' | 'help';
  /** Only for the person who asked. */
  readonly private: boolean;
  readonly pictures?: readonly ShownPicture[];
};

/** A button, or a line of a menu, that someone chose. */
export type Press = {
  readonly actionId: string;
  readonly value: string | null;
  readonly place: AskedWhere;
  readonly from: AskedFrom;
};

export type Converse = (asking: Asking) => Promise<readonly SpokenReply[]>;

/** What is said in this workspace, and by whom it is thought up. */
export type Conversation = {
  readonly converse: Converse;
  readonly press: (press: Press) => Promise<readonly SpokenReply[]>;
  /** Finds out who is listening there. Before it is done nothing may be shown in the place. */
  readonly ready: (asker: Pick<Asking, 'place' | 'from'>) => Promise<void>;
  /** Three questions that work here, for a mention without a word. */
  readonly examples: (asker: Pick<Asking, 'place' | 'from'>) => Promise<readonly SpokenReply[]>;
  /** Words in a thread that do not address the bot; null where it does not listen to them. */
  readonly overhear: Converse | null;
  /** The form of the global shortcut. */
  readonly form: AskForm;
  /** The page of one person's home, after what they chose there, where they chose something. */
  readonly home: (
    asker: Pick<Asking, 'place' | 'from'>,
    page: number,
    chosen: Pick<Press, 'actionId' | 'value'> | null,
  ) => Promise<View>;
};

/** `error` is for the operator: something that people did not get although they should have. */
export type Logger = {
  readonly info: (message: string) => void;
  readonly warn: (message: string) => void;
  readonly error: (message: string) => void;
};

/** Runs something later; the result calls it off. */
export type Timers = { readonly after: (delayMs: number, run: () => void) => () => void };
export type Time = Clock & Timers;

/** Remembers what was dealt with: true exactly once for each key. */
export type SeenEvents = { readonly firstSeen: (key: string) => Promise<boolean> };

/** What the platform sent, before anyone has looked at it. */
export type Received = { readonly body: Readonly<Record<string, unknown>>; readonly retryNumber: number };

/** Something that arrived and is to be dealt with now. */
export type Dealing = {
  /** False where the store could not keep it: then it is acknowledged only once it is dealt with. */
  readonly kept: boolean;
  /** Says that it is dealt with. */
  readonly done: () => Promise<void>;
};

/**
 * Keeps what arrives until it is dealt with. The platform is told that it arrived only after `keep` is done, and it sends
 * again what `keep` fails on. Null: it was dealt with, or is under way.
 */
export type Inbox = { readonly keep: (received: Received) => Promise<Dealing | null> };

/** What an earlier try at an answer, cut short by a crash, has left in the workspace. */
export type Recalled = {
  readonly again: boolean;
  /** The placeholder that may still stand. */
  readonly standing: { readonly channel: string; readonly ts: string } | null;
  /** The placeholder that was to become the answer, with what it was to say. */
  readonly editing: PostedContent | null;
  /** The answer was about to be posted, or was: whoever has it in hand sees to it that it is. */
  readonly replied: boolean;
};

export type EventMemory = {
  readonly recall: (eventKey: string) => Promise<Recalled>;
  /** Notes that a message is about to be changed into the answer. */
  readonly willEdit: (eventKey: string, into: PostedContent) => Promise<void>;
};

export type SlackPorts = {
  readonly conversation: Conversation;
  readonly log: Logger;
  readonly time: Time;
  /** A new opaque identifier, never the same twice. */
  readonly newId: () => string;
  readonly seen: SeenEvents;
  /** What makes receiving and sending survive the process. */
  readonly store: DurableStore;
  /** What is known of channels and people. */
  readonly places: Places;
  /** What the platform tells of the workspace itself goes there. */
  readonly onNews: (news: News) => Promise<void>;
};
