import { makeTray } from './tray.ts';
import type { Block, Message, Metadata } from './workspace.ts';

export type Posted = {
  readonly channel: string;
  readonly ts: string;
  readonly threadTs: string | null;
  readonly text: string;
  readonly blocks: readonly Block[];
  readonly metadata: Metadata | null;
  /** Every argument as it was sent. */
  readonly args: Arguments;
};

export type Updated = Omit<Posted, 'threadTs' | 'metadata'>;

export type Whispered = Omit<Posted, 'metadata'> & {
  readonly user: string;
  /** Whether the person sees it: in a thread only where the thread has replies. */
  readonly shown: boolean;
};

/** What was sent to a response address. */
export type Responded = {
  readonly channel: string;
  readonly user: string;
  readonly responseType: 'ephemeral' | 'in_channel';
  readonly text: string;
  readonly blocks: readonly Block[];
  readonly replaceOriginal: boolean;
  readonly deleteOriginal: boolean;
};

export type Arguments = Readonly<Record<string, unknown>>;

export type Called = {
  readonly method: string;
  readonly args: Arguments;
  /** What the platform did: `ok`, its error code, a status, or `dropped`. */
  readonly outcome: string;
};

/** Everything the bot did, as it reached the platform. Only what was accepted is among posts, updates and the like. */
export const makeRecords = () => ({
  calls: makeTray<Called>('calls'),
  posts: makeTray<Posted>('posts'),
  updates: makeTray<Updated>('updates'),
  deletions: makeTray<Message>('deletions'),
  ephemerals: makeTray<Whispered>('ephemerals'),
  responses: makeTray<Responded>('responses'),
  pins: makeTray<{ readonly channel: string; readonly ts: string; readonly pinned: boolean }>('pins'),
  uploads: makeTray<{ readonly id: string; readonly bytes: Buffer }>('uploads'),
  /** How what was sent broke the platform's limits; a platform that is stopped with any among them throws. */
  limitFaults: [] as string[],
  views: makeTray<{ readonly kind: 'open' | 'update' | 'publish'; readonly view: unknown }>('views'),
});

export type Records = ReturnType<typeof makeRecords>;
