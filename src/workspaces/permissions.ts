import type { AskedFrom } from '../terms/records.ts';

/** Who wants something, and where what they get will be seen. */
export type Asker = { readonly place: string; readonly from: AskedFrom };

/** `silent`: nothing is said at all, else the message is said to the asker alone. */
export type Verdict =
  | { readonly ok: true }
  | { readonly ok: false; readonly silent: boolean; readonly message: string };

/** What an answer on record is told by: the verb that was asked and the place where it was asked. */
export type Born = Asker & { readonly verb: string };

/** Who made a digest or a watch, and where it posts. */
export type Managed = { readonly team: string; readonly channel: string; readonly owner: string };

/**
 * Whether something may be posted into a place on somebody's behalf. `paused` can become right again by itself and is
 * taken up then; `stopped` is not, since others can read along now.
 */
export type PlaceVerdict =
  | { readonly kind: 'fine' }
  | {
      readonly kind: 'paused';
      readonly why: 'archived' | 'notMember' | 'gone' | 'restricted' | 'ownerLeft';
    }
  | { readonly kind: 'stopped'; readonly why: 'shared' | 'guests' };

/** Who may do what: the one thing that every way to a figure or a record asks. */
export type Permissions = {
  /** Looks up what is not known yet of the place and of the person; done after a few seconds at most, known or not. */
  readonly learn: (asker: Asker) => Promise<void>;
  /** Whether anything is said to this person in this place now. Counts: once for each message and each press. */
  readonly admit: (asker: Asker) => Verdict;
  readonly mayAsk: (asker: Asker, verb: string) => Verdict;
  /** Whether the asker may read, here and now, what was asked there. */
  readonly mayRead: (asker: Asker, born: Born) => boolean;
  /** Whether the asker may change or stop it. Pausing is for everybody who may ask for one in its channel. */
  readonly mayManage: (asker: Asker, managed: Managed) => boolean;
  /** Before each post that nobody is waiting for. */
  readonly placeVerdict: (team: string, channel: string, owner: string) => Promise<PlaceVerdict>;
};

export const allowed: Verdict = { ok: true };

/** For a place that belongs to one person alone, such as a terminal. */
export const everythingAllowed: Permissions = {
  learn: async () => {},
  admit: () => allowed,
  mayAsk: () => allowed,
  mayRead: () => true,
  mayManage: () => true,
  placeVerdict: async () => ({ kind: 'fine' }),
};
