import type { SayingOutcome } from '../../terms/delivery.ts';
import {
  awaitsFile,
  type Content,
  fileProcessingPauseMs,
  looksRefused,
  looksRefusedNote,
  plainly,
  textAlone,
} from './content.ts';
import { deliveryEventType, type Found, lookUp, type Self } from './lookup.ts';
import type { Pace } from './pace.ts';
import type { Logger, Time } from './ports.ts';
import { callTimeoutMs, type WhenUnsure } from './settings.ts';
import type { Slots } from './slots.ts';
import { wait } from './wait.ts';
import type { Outcome, Wire } from './wire.ts';

export type Destination = { readonly channel: string; readonly threadTs: string | null };

export type Delivering = {
  readonly wire: Wire;
  readonly pace: Pace;
  /** Room for the posts that nobody waits for, so that they never take all of the line. */
  readonly slots: Slots;
  readonly time: Time;
  readonly log: Logger;
  readonly self: Self;
  /** Without the scopes to read history a lost answer stays a riddle. */
  readonly canLookUp: boolean;
  readonly whenUnsure: WhenUnsure;
};

/** Whether the post may stand already: an attempt of which it is not known what became, or none that is known of. */
export type Earlier =
  | { readonly kind: 'none' }
  | { readonly kind: 'possible' }
  | { readonly kind: 'unsure'; readonly attemptedMs: number };

/** What is known of a post, and how the attempts at it are noted. */
export type Sending = {
  readonly deliveryId: string;
  readonly urgent: boolean;
  readonly expiresAtMs: number | null;
  /** From when on an earlier attempt at it may stand. */
  readonly sinceMs: number;
  readonly earlier: Earlier;
  /** Notes that an attempt begins; false where it is somebody else's by now. */
  readonly begin: () => Promise<boolean>;
  /** Notes that the attempt is known to have done nothing. */
  readonly undone: () => Promise<void>;
};

/** `taken`: somebody else deals with it now. */
export type Sent = SayingOutcome | { readonly kind: 'taken' };

const firstRetryMs = 5_000;
const longestRetryMs = 60_000;
/** An unsure call may be under way until its time is up; then the platform gets this long to show the message. */
const settleMs = 10_000;
const lookAgainMs = 15_000;
const mostLooks = 6;
/** How far before the first attempt the search begins: the clocks may differ. */
const lookBackMs = 60_000;

const argumentsOf = (to: Destination, content: Content, deliveryId: string) => ({
  channel: to.channel,
  ...(to.threadTs === null ? {} : { thread_ts: to.threadTs }),
  text: content.text,
  ...(content.blocks.length === 0 ? {} : { blocks: content.blocks }),
  ...plainly,
  metadata: { event_type: deliveryEventType, event_payload: { id: deliveryId } },
});

/** Where an unsure post stands. Only what is absent twice, some time apart, counts as absent. */
const seek = async (time: Time, look: () => Promise<Found>): Promise<Found> => {
  let absences = 0;
  let last: Found = { kind: 'absent' };
  for (let looks = 0; looks < mostLooks; looks += 1) {
    if (looks > 0) await wait(time, lookAgainMs);
    last = await look();
    if (last.kind === 'found') return last;
    if (last.kind === 'absent') absences += 1;
    if (absences === 2) return last;
  }
  return last.kind === 'absent' ? { kind: 'cannot tell', reason: 'looked in vain' } : last;
};

const stamp = (body: Readonly<Record<string, unknown>>): string =>
  typeof body['ts'] === 'string' ? body['ts'] : '';

type Failing = (to: Destination, code: string, details?: readonly string[]) => Sent;

const failingWith =
  ({ error }: Logger): Failing =>
  (to, code, details = []) => {
    error(`A message to ${to.channel} was not delivered: ${[code, ...details].join('; ')}.`);
    return { kind: 'refused', code };
  };

/** Finds out what became of attempts whose answer is lost, or that others have made. */
const makeLookBack = (desk: Delivering, failed: Failing) => {
  const { time, log } = desk;

  /** What is done where nobody can know: the settings say which of the two risks is taken. */
  const asSettingsSay = (to: Destination, reason: string): Sent | null => {
    if (desk.whenUnsure === 'leave') return failed(to, `answer lost, ${reason}`);
    log.warn(`A message to ${to.channel} is repeated and may stand twice: answer lost, ${reason}.`);
    return null;
  };

  const find = (to: Destination, { deliveryId, sinceMs }: Sending): Promise<Found> =>
    lookUp(desk.wire, desk.self, { ...to, deliveryId, sinceMs: sinceMs - lookBackMs });

  /** What became of an unsure post; null where it has to be posted again. */
  const clearUp = async (to: Destination, sending: Sending, attemptedMs: number): Promise<Sent | null> => {
    const untilSettledMs = attemptedMs + callTimeoutMs + settleMs - time.nowMs();
    if (untilSettledMs > 0) await wait(time, untilSettledMs);
    if (!desk.canLookUp) return asSettingsSay(to, 'and no scope to look it up');
    const found = await seek(time, () => find(to, sending));
    if (found.kind === 'found') return { kind: 'said', ts: found.ts };
    return found.kind === 'absent' ? null : asSettingsSay(to, `and no look-up (${found.reason})`);
  };

  /** What came of attempts that others may have made; null where it has to be posted. */
  const lookBefore = async (to: Destination, sending: Sending): Promise<Sent | null> => {
    const { earlier } = sending;
    if (earlier.kind === 'unsure') return clearUp(to, sending, earlier.attemptedMs);
    if (earlier.kind === 'none' || !desk.canLookUp) return null;
    const found = await find(to, sending);
    return found.kind === 'found' ? { kind: 'said', ts: found.ts } : null;
  };

  return { clearUp, lookBefore };
};

type Attempt = (Outcome | { readonly kind: 'over' | 'taken' }) & { readonly startedMs: number };

/**
 * Posts a message once, whatever happens to the answers. The delivery id in its metadata tells whether a post whose
 * answer was lost has arrived; it is posted again only once it is known not to have.
 */
export const makeSend = (desk: Delivering) => {
  const { time, log } = desk;
  const failed = failingWith(log);
  const { clearUp, lookBefore } = makeLookBack(desk, failed);

  const posted = (outcome: Extract<Outcome, { kind: 'done' }>): Sent => {
    if (outcome.warnings.includes('invalid_metadata_schema'))
      log.error('The platform dropped the delivery id of a post: a lost answer could not be cleared up.');
    return { kind: 'said', ts: stamp(outcome.body) };
  };

  const isOver = ({ expiresAtMs }: Sending): boolean => expiresAtMs !== null && time.nowMs() > expiresAtMs;

  const attempt = async (to: Destination, content: Content, sending: Sending): Promise<Attempt> => {
    await desk.pace.turn(to.channel, sending.urgent);
    const call = async (): Promise<Attempt> => {
      const startedMs = time.nowMs();
      if (isOver(sending)) return { kind: 'over', startedMs };
      if (!(await sending.begin())) return { kind: 'taken', startedMs };
      const outcome = await desk.wire.call('chat.postMessage', argumentsOf(to, content, sending.deliveryId));
      return { ...outcome, startedMs };
    };
    return sending.urgent ? call() : desk.slots.use(call);
  };

  return async (to: Destination, content: Content, sending: Sending): Promise<Sent> => {
    let shown = content;
    const firstMs = time.nowMs();
    const standing = await lookBefore(to, sending);
    if (standing !== null) return standing;
    for (let pauseMs = firstRetryMs; ; ) {
      const outcome = await attempt(to, shown, sending);
      if (outcome.kind === 'over') return { kind: 'expired' };
      if (outcome.kind === 'taken') return { kind: 'taken' };
      if (outcome.kind === 'done') return posted(outcome);
      if (outcome.kind === 'unsure') {
        const cleared = await clearUp(to, sending, outcome.startedMs);
        if (cleared !== null) return cleared;
        continue;
      }
      await sending.undone();
      if (outcome.kind === 'limited') desk.pace.hold(to.channel, outcome.retryAfterMs);
      if (outcome.kind === 'unreached') {
        await wait(time, pauseMs);
        pauseMs = Math.min(longestRetryMs, 2 * pauseMs);
      }
      if (outcome.kind !== 'refused') continue;
      if (!looksRefused(outcome, shown)) return failed(to, outcome.code, outcome.details);
      if (awaitsFile(outcome, shown, firstMs, time.nowMs())) {
        await wait(time, fileProcessingPauseMs);
        continue;
      }
      log.error(looksRefusedNote(outcome));
      shown = textAlone(shown);
    }
  };
};
