import { z } from 'zod';
import type { InstantMs } from '../../../terms/clock.ts';
import type { InboxEvent } from '../../../terms/inbox.ts';
import { commandKeyOf, typedCommand } from '../command.ts';
import { heardIn } from '../heard.ts';
import type { Self } from '../lookup.ts';
import { pressedOn, pressKeyOf } from '../press.ts';

const eventBody = z.object({ team_id: z.string(), event: z.unknown() });

const stampMs = (ts: string): InstantMs => Math.floor(Number(ts) * 1_000);

const questionOf = (body: unknown, self: Self): Omit<InboxEvent, 'body'> | null => {
  const read = eventBody.safeParse(body);
  const heard = read.success ? heardIn(read.data.event, read.data.team_id, self) : null;
  if (heard === null) return null;
  const askedAtMs = stampMs(heard.editedTs ?? heard.ts);
  return { key: heard.eventKey, messageKey: heard.messageKey, kind: 'question', askedAtMs };
};

/** A command without words opens a form at once or never: there is nothing to answer later. */
const commandOf = (body: unknown, nowMs: InstantMs): Omit<InboxEvent, 'body'> | null => {
  const read = typedCommand.safeParse(body);
  if (!read.success || read.data.text.trim() === '') return null;
  return { key: commandKeyOf(read.data), messageKey: null, kind: 'command', askedAtMs: nowMs };
};

/** Presses in forms and on the home page are answered at once or never. */
const pressOf = (body: unknown, nowMs: InstantMs): Omit<InboxEvent, 'body'> | null => {
  const read = pressedOn.safeParse(body);
  return read.success
    ? { key: pressKeyOf(read.data), messageKey: null, kind: 'press', askedAtMs: nowMs }
    : null;
};

/** The token by which requests used to be told from forgeries is of no use later, and no secret is kept. */
const withoutToken = (key: string, value: unknown): unknown => (key === 'token' ? undefined : value);

/** What a person asks in what arrived; null where nothing is asked that could be answered later. */
export const eventOf = (body: unknown, self: Self, nowMs: InstantMs): InboxEvent | null => {
  const asked = questionOf(body, self) ?? pressOf(body, nowMs) ?? commandOf(body, nowMs);
  return asked === null ? null : { ...asked, body: JSON.stringify(body, withoutToken) };
};
