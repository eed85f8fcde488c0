import { type Content, looksRefused, looksRefusedNote, plainly, textAlone } from './content.ts';
import { deliveryEventType, type Found, lookUp, type Self } from './lookup.ts';
import type { Pace } from './pace.ts';
import type { Logger, Time } from './ports.ts';
import { callTimeoutMs } from './settings.ts';
import { wait } from './wait.ts';
import type { Outcome, Wire } from './wire.ts';

export type Destination = { readonly channel: string; readonly threadTs: string | null };

export type Delivered =
  | { readonly ok: true; readonly ts: string }
  | { readonly ok: false; readonly code: string };

export type Delivering = {
  readonly wire: Wire;
  readonly pace: Pace;
  readonly time: Time;
  readonly log: Logger;
  readonly newId: () => string;
  readonly self: Self;
  /** Without the scopes to read history a lost answer stays a riddle, and the post is not repeated. */
  readonly canLookUp: boolean;
};

const mostAttempts = 8;
const retryUnreachedMs = 5_000;
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
const seek = async (desk: Delivering, look: () => Promise<Found>): Promise<Found> => {
  let absences = 0;
  let last: Found = { kind: 'absent' };
  for (let looks = 0; looks < mostLooks; looks += 1) {
    if (looks > 0) await wait(desk.time, lookAgainMs);
    last = await look();
    if (last.kind === 'found') return last;
    if (last.kind === 'absent') absences += 1;
    if (absences === 2) return last;
  }
  return last.kind === 'absent' ? { kind: 'cannot tell', reason: 'looked in vain' } : last;
};

const stamp = (body: Readonly<Record<string, unknown>>): string =>
  typeof body['ts'] === 'string' ? body['ts'] : '';

/**
 * Posts a message once, whatever happens to the answers. The delivery id in its metadata tells whether a post whose
 * answer was lost has arrived; it is posted again only once it is known not to have.
 */
export const makeDeliver = (desk: Delivering) => {
  const posted = (outcome: Extract<Outcome, { kind: 'done' }>): Delivered => {
    if (outcome.warnings.includes('invalid_metadata_schema'))
      desk.log.error(
        'The platform dropped the delivery id of a post: a lost answer could not be cleared up.',
      );
    return { ok: true, ts: stamp(outcome.body) };
  };

  const failed = (to: Destination, code: string, details: readonly string[] = []): Delivered => {
    desk.log.error(`A message to ${to.channel} was not delivered: ${[code, ...details].join('; ')}.`);
    return { ok: false, code };
  };

  /** What became of an unsure post; null where it has to be posted again. */
  const clearUp = async (to: Destination, deliveryId: string, sinceMs: number): Promise<Delivered | null> => {
    if (!desk.canLookUp) return failed(to, 'answer lost, and no scope to look it up');
    const sought = { ...to, deliveryId, sinceMs };
    const found = await seek(desk, () => lookUp(desk.wire, desk.self, sought));
    if (found.kind === 'found') return { ok: true, ts: found.ts };
    return found.kind === 'absent' ? null : failed(to, `answer lost, and no look-up (${found.reason})`);
  };

  return async (to: Destination, content: Content): Promise<Delivered> => {
    const deliveryId = desk.newId();
    const sinceMs = desk.time.nowMs() - lookBackMs;
    let shown = content;
    for (let attempt = 0; attempt < mostAttempts; attempt += 1) {
      await desk.pace.turn(to.channel);
      const startedMs = desk.time.nowMs();
      const outcome = await desk.wire.call('chat.postMessage', argumentsOf(to, shown, deliveryId));
      if (outcome.kind === 'done') return posted(outcome);
      if (outcome.kind === 'limited') desk.pace.hold(to.channel, outcome.retryAfterMs);
      if (outcome.kind === 'unreached') await wait(desk.time, retryUnreachedMs);
      if (outcome.kind === 'unsure') {
        await wait(desk.time, startedMs + callTimeoutMs + settleMs - desk.time.nowMs());
        const cleared = await clearUp(to, deliveryId, sinceMs);
        if (cleared !== null) return cleared;
      }
      if (looksRefused(outcome, shown)) {
        desk.log.error(looksRefusedNote(outcome));
        shown = textAlone(shown);
      } else if (outcome.kind === 'refused') return failed(to, outcome.code, outcome.details);
    }
    return failed(to, 'the platform could not be reached');
  };
};
