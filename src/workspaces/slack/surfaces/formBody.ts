import { z } from 'zod';
import type { AskValues } from '../../surfaces/askForm.ts';

const fieldState = z.object({
  value: z.string().nullish(),
  selected_option: z.object({ value: z.string() }).nullish(),
  selected_conversation: z.string().nullish(),
});

const view = z.object({
  id: z.string(),
  callback_id: z.string().default(''),
  hash: z.string().optional(),
  state: z.object({ values: z.record(z.string(), z.record(z.string(), fieldState)) }).optional(),
});

const who = { team: z.object({ id: z.string() }).nullish(), user: z.object({ id: z.string() }) };

/** A press of something in a form, or of its last button. */
export const formBody = z.object({
  ...who,
  view,
  response_urls: z
    .array(z.object({ action_id: z.string(), channel_id: z.string(), response_url: z.string() }))
    .default([]),
});
export type FormBody = z.infer<typeof formBody>;

/** What stands in the fields. An element has the name of its block. */
export const valuesOf = ({ view: { state } }: FormBody): AskValues => {
  const fieldValue = (name: string): string | null => {
    const field = state?.values[name]?.[name];
    return field?.selected_option?.value ?? field?.selected_conversation ?? field?.value ?? null;
  };
  return {
    verb: fieldValue('verb'),
    ticker: fieldValue('ticker'),
    window: fieldValue('window'),
    level: fieldValue('level'),
    place: fieldValue('place'),
  };
};

/** Who asks, in the place that was chosen. */
export const askerOf = ({ team, user }: FormBody, place: string | null) => ({
  place: place?.startsWith('D') === true ? ('direct' as const) : ('channel' as const),
  from: { team: team?.id ?? null, channel: place, person: user.id, message: null, thread: null },
});
