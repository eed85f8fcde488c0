import { type Result, refuse, succeed } from '../terms/result.ts';
import { type AnswerStore, answerStore } from './answers.ts';
import { type Access, accessTo, type Connection, storeProblem } from './connection.ts';
import { type ConversationStore, conversationStore } from './conversations.ts';
import { type DeliveryStore, deliveryStore } from './deliveries.ts';
import { type InboxStore, inboxStore } from './inbox.ts';
import { type PinStore, pinStore } from './pins.ts';
import { type SubscriptionStore, subscriptionStore } from './subscriptions.ts';

/** Each part of the records in a file of its own, all of them on one database. */
export type StoreParts = AnswerStore & {
  readonly inbox: InboxStore;
  readonly deliveries: DeliveryStore;
  readonly subscriptions: SubscriptionStore;
  readonly pins: PinStore;
  readonly conversations: ConversationStore;
};

/** The records. Whatever the machinery beneath does wrong comes back as a problem, never as an exception. */
export type Store = StoreParts & {
  /** Writes a whole copy to a file while the store goes on. */
  readonly backUp: (path: string) => Promise<Result<null>>;
  readonly close: () => Promise<void>;
};

export const storeParts = (access: Access): StoreParts => ({
  ...answerStore(access),
  inbox: inboxStore(access),
  deliveries: deliveryStore(access),
  subscriptions: subscriptionStore(access),
  pins: pinStore(access),
  conversations: conversationStore(access),
});

export const copied = async (connection: Connection, path: string): Promise<Result<null>> => {
  try {
    await connection.copyTo(path);
    return succeed(null);
  } catch (error) {
    return refuse(storeProblem(error));
  }
};

export const makeStore = (connection: Connection): Store => ({
  ...storeParts(accessTo(connection)),
  backUp: (path) => copied(connection, path),
  close: connection.close,
});
