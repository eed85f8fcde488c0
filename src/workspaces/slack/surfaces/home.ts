import { z } from 'zod';
import type { Conversation, Logger, Press } from '../ports.ts';
import type { Wire } from '../wire.ts';

export type Homing = { readonly conversation: Conversation; readonly wire: Wire; readonly log: Logger };

const opened = z.object({ user: z.string(), tab: z.string().optional() });

const pressedAtHome = z.object({
  team: z.object({ id: z.string() }).nullish(),
  user: z.object({ id: z.string() }),
  view: z.object({ type: z.literal('home'), private_metadata: z.string().default('0') }),
  actions: z
    .array(
      z.object({
        action_id: z.string(),
        value: z.string().optional(),
        selected_option: z.object({ value: z.string() }).nullish(),
      }),
    )
    .min(1),
});

const change = z.object({ action: z.string(), id: z.string() });

/** At home everything is seen by one person alone, as in a direct conversation. */
const askerAt = (team: string | null, person: string): Pick<Press, 'place' | 'from'> => ({
  place: 'direct',
  from: { team, channel: null, person, message: null, thread: null },
});

const publish = async (
  { conversation, wire, log }: Homing,
  asker: Pick<Press, 'place' | 'from'>,
  page: number,
  chosen: Pick<Press, 'actionId' | 'value'> | null,
): Promise<void> => {
  const view = await conversation.home(asker, page, chosen);
  const outcome = await wire.call('views.publish', { user_id: asker.from.person, view });
  if (outcome.kind !== 'done') log.warn(`A home page was not shown: ${outcome.kind}.`);
};

/** Shows somebody their home page when they open it. */
export const showHome = async (homing: Homing, event: unknown, team: string): Promise<void> => {
  const read = opened.safeParse(event);
  if (!read.success || read.data.tab === 'messages') return;
  await publish(homing, askerAt(team, read.data.user), 0, null);
};

const readChange = (value: string | undefined): z.infer<typeof change> | null => {
  try {
    return change.parse(JSON.parse(value ?? ''));
  } catch {
    return null;
  }
};

/** A menu's line changes a digest or a watch, a button turns the page; either way the page is shown anew. Whether it was a press at home. */
export const pressedHome = async (homing: Homing, body: unknown): Promise<boolean> => {
  const read = pressedAtHome.safeParse(body);
  if (!read.success) return false;
  const { team, user, view, actions } = read.data;
  const asker = askerAt(team?.id ?? null, user.id);
  const [action] = actions;
  const here = Number(view.private_metadata) || 0;
  const wanted = readChange(action?.selected_option?.value);
  if (wanted === null) {
    await publish(homing, asker, Number(action?.value ?? here) || 0, null);
    return true;
  }
  await publish(homing, asker, here, {
    actionId: wanted.action,
    value: JSON.stringify({ id: wanted.id }),
  });
  return true;
};
