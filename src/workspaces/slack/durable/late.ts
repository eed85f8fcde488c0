import type { KeptEvent } from '../../../terms/inbox.ts';
import type { Deliveries } from '../../deliveries.ts';
import { typedCommand } from '../command.ts';
import { heardIn } from '../heard.ts';
import { lateKey } from '../keys.ts';
import type { Self } from '../lookup.ts';
import type { SpokenReply, Time } from '../ports.ts';
import { placeOfPress, pressedOn } from '../press.ts';
import { placeOf } from '../question.ts';
import type { Respond } from '../respond.ts';

/** What was asked longer ago is not answered any more: what happened since may have changed the answer or the need. */
const answerWithinMs = 600_000;
/** An event at which so many have failed is not tried again: it may be what brings the process down. */
const mostTries = 4;
const lineLifeMs = 3_600_000;

export type LateDesk = {
  readonly self: Self;
  readonly time: Time;
  readonly deliveries: Deliveries;
  readonly respond: Respond;
};

const line = (text: string): SpokenReply => ({ text, blocks: [], kind: 'refusal', private: false });

/** Why an event that was left undone is not answered any more; null where it still is. */
export const lineInstead = (event: KeptEvent, nowMs: number): SpokenReply | null => {
  if (nowMs - event.askedAtMs > answerWithinMs)
    return line(
      'This was asked while I was away, and I have not answered it. Ask again if it still matters.',
    );
  return event.tries > mostTries
    ? line('I have failed at this several times and leave it unanswered. The desk’s operator can see why.')
    : null;
};

type Place = { readonly team: string; readonly channel: string; readonly threadTs: string | null };

const placeOfEvent = ({ kind, body }: KeptEvent, self: Self): Place | null => {
  const parsed: { readonly event?: unknown; readonly team_id?: string } = JSON.parse(body);
  if (kind === 'question') {
    const heard = heardIn(parsed.event, parsed.team_id ?? '', self);
    return heard === null ? null : placeOf(heard);
  }
  const pressed = pressedOn.safeParse(parsed);
  return pressed.success && pressed.data.container.is_ephemeral !== true ? placeOfPress(pressed.data) : null;
};

/** Says one line where the answer would have stood. A response address that is too old to be used says nothing. */
export const sayLate = async (desk: LateDesk, event: KeptEvent, said: SpokenReply): Promise<void> => {
  const place = placeOfEvent(event, desk.self);
  if (place !== null) {
    const { team, channel, threadTs } = place;
    await desk.deliveries.say({
      key: lateKey(event.key),
      team,
      channel,
      threadTs,
      content: { text: said.text, blocks: said.blocks },
      urgent: true,
      expiresAtMs: desk.time.nowMs() + lineLifeMs,
    });
    return;
  }
  const command = typedCommand.safeParse(JSON.parse(event.body));
  if (command.success) await desk.respond(command.data.response_url, [said]);
};
