import { z } from 'zod';
import { emptyForm } from '../../surfaces/askForm.ts';
import { repliesOrApology, type Speaking } from '../answer.ts';
import { headed } from '../content.ts';
import type { Conversation } from '../ports.ts';
import type { Respond } from '../respond.ts';
import { atMost } from '../wait.ts';
import type { Wire } from '../wire.ts';
import { askerOf, type FormBody, formBody, valuesOf } from './formBody.ts';
import { sayOpenly } from './sayOpenly.ts';

export type Forming = Speaking & {
  readonly conversation: Conversation;
  readonly wire: Wire;
  readonly respond: Respond;
};

/** The platform waits three seconds for an answer about a form; finding out who listens may take most of them. */
const readyLimitMs = 2_000;

const opening = z.object({ trigger_id: z.string() });

/** Opens the form. Its trigger lives three seconds, so nothing is looked up before. */
export const openForm = async ({ wire, conversation, log }: Forming, body: unknown): Promise<void> => {
  const read = opening.safeParse(body);
  if (!read.success) return;
  const view = conversation.form.view(emptyForm);
  const outcome = await wire.call('views.open', { trigger_id: read.data.trigger_id, view });
  if (outcome.kind !== 'done') log.warn(`A form was not opened: ${outcome.kind}.`);
};

/**
 * Shows what the fields make so far. The hash lets the platform refuse an update that a newer one has overtaken, which
 * is as well.
 */
export const checkForm = async ({ wire, conversation, log }: Forming, body: unknown): Promise<void> => {
  const read = formBody.safeParse(body);
  if (!read.success) return;
  const { id, hash } = read.data.view;
  const outcome = await wire.call('views.update', {
    view_id: id,
    ...(hash === undefined ? {} : { hash }),
    view: conversation.form.view(valuesOf(read.data)),
  });
  if (outcome.kind === 'done' || (outcome.kind === 'refused' && outcome.code === 'hash_conflict')) return;
  log.warn(`A form was not brought up to date: ${outcome.kind}.`);
};

const typedAhead = z.object({ value: z.string() });

/** What a type-ahead offers, to who may ask in the place chosen so far or in a direct conversation. */
export const offerTickers = async ({ conversation, time }: Forming, body: unknown) => {
  const [read, typed] = [formBody.safeParse(body), typedAhead.safeParse(body)];
  if (!read.success || !typed.success) return [];
  const { place } = valuesOf(read.data);
  const askers = [askerOf(read.data, place), { ...askerOf(read.data, null), place: 'direct' as const }];
  await atMost(time, readyLimitMs, Promise.all(askers.map(conversation.ready)));
  return conversation.form.tickers(askers, typed.data.value);
};

const formNote = 'Asked with the form.';
const noPinNote = 'Asked with the form. The bot is no member here: this message cannot be pinned or changed.';

/** Says the answers in the chosen place, the refusals to the asker alone. */
const answerForm = async (forming: Forming, body: FormBody, question: string): Promise<void> => {
  const { conversation, respond, log } = forming;
  const { place } = valuesOf(body);
  const asker = askerOf(body, place);
  const url = body.response_urls.find(({ channel_id }) => channel_id === place)?.response_url ?? null;
  const replies = await repliesOrApology(log, () => conversation.converse({ text: question, ...asker }));
  for (const [number, reply] of replies.entries()) {
    if (reply.private) {
      if (url !== null) await respond(url, [reply]);
      continue;
    }
    await sayOpenly(forming, {
      key: `form:${body.view.id}:${number}`,
      team: asker.from.team ?? '',
      channel: place ?? '',
      reply: headed(reply, formNote),
      otherwise: url === null ? null : { url, reply: headed(reply, noPinNote) },
    });
  }
};

/** What the platform is told of a form that was sent: errors keep it open, null closes it. */
export type FormVerdict = {
  readonly response_action: 'errors';
  readonly errors: Record<string, string>;
} | null;

/** The final check: the form closes only where the question can be asked in the chosen place. */
export const submitForm = async (
  forming: Forming,
  body: unknown,
  tell: (verdict: FormVerdict) => Promise<void>,
): Promise<void> => {
  const read = formBody.safeParse(body);
  if (!read.success) return tell(null);
  const { conversation, time } = forming;
  const values = valuesOf(read.data);
  const asker = askerOf(read.data, values.place);
  await atMost(time, readyLimitMs, conversation.ready(asker));
  const checked = conversation.form.read(asker, values);
  if (!checked.ok) return tell({ response_action: 'errors', errors: { ...checked.faults } });
  await tell(null);
  await answerForm(forming, read.data, checked.question);
};
