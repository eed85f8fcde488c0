import { z } from 'zod';
import { viewFaults } from '../../../src/present/limits/viewFaults.ts';
import type { Sent } from './deliveries.ts';
import type { OpenView } from './desk.ts';
import type { Stage } from './events.ts';
import { triggerOf } from './triggers.ts';
import { type Block, bot, team } from './workspace.ts';

type Shown = {
  readonly type: string;
  readonly callback_id?: string;
  readonly private_metadata?: string;
  readonly blocks: readonly Block[];
};

type Element = { readonly type: string; readonly action_id: string; readonly [more: string]: unknown };

const isElement = (value: unknown): value is Element =>
  typeof value === 'object' && value !== null && 'action_id' in value;

const isShown = (view: unknown): view is Shown =>
  typeof view === 'object' && view !== null && 'blocks' in view && Array.isArray(view.blocks);

const shownIn = (held: OpenView): Shown => {
  if (!isShown(held.view)) throw new Error('no view stands there');
  return held.view;
};

const elementsOf = (block: Block): readonly Element[] =>
  [
    block['element'],
    block['accessory'],
    ...(Array.isArray(block['elements']) ? block['elements'] : []),
  ].filter(isElement);

const elementIn = (view: Shown, actionId: string) => {
  for (const block of view.blocks) {
    const element = elementsOf(block).find((each) => each.action_id === actionId);
    if (element !== undefined) return { blockId: String(block['block_id'] ?? 'b0'), element };
  }
  throw new Error(`nothing with the action id ${actionId} in the view`);
};

/** What a person chose or typed, as the platform reports it for that kind of element. */
const stateOf = ({ type }: Element, value: string) => {
  if (type === 'plain_text_input') return { type, value };
  if (type === 'conversations_select') return { type, selected_conversation: value };
  return { type, selected_option: { text: { type: 'plain_text', text: value }, value } };
};

const offered = z.object({ options: z.array(z.unknown()) });

/** A list of options has the same limits wherever it comes from. */
const formWith = (element: object) => ({
  type: 'modal',
  title: { type: 'plain_text', text: 'Options' },
  blocks: [{ type: 'input', label: { type: 'plain_text', text: 'Options' }, element }],
});

export type Filled = Readonly<Record<string, string>>;

/** What people do in forms and on the home page. */
export const makeViewing = ({ desk, responses, deliver }: Stage) => {
  const who = (user: string) => ({ id: user, username: user.toLowerCase(), team_id: team.id });

  const stateValues = (view: Shown, filled: Filled) =>
    Object.fromEntries(
      Object.entries(filled).map(([actionId, value]) => {
        const { blockId, element } = elementIn(view, actionId);
        return [blockId, { [actionId]: stateOf(element, value) }];
      }),
    );

  const described = (held: OpenView, filled: Filled, hash = held.hash) => {
    const shown = shownIn(held);
    return {
      id: held.id,
      type: shown.type,
      hash,
      callback_id: shown.callback_id ?? '',
      private_metadata: shown.private_metadata ?? '',
      state: { values: stateValues(shown, filled) },
    };
  };

  const common = { team, api_app_id: bot.appId, token: 'verification' };

  const actions = (held: OpenView, actionId: string, value: string) => {
    const { blockId, element } = elementIn(shownIn(held), actionId);
    const stamp = desk.workspace.stamp();
    const state = element.type === 'button' ? { value: element['value'] } : stateOf(element, value);
    return [{ ...state, type: element.type, action_id: actionId, block_id: blockId, action_ts: stamp }];
  };

  const interact = (
    held: OpenView,
    actionId: string,
    value: string,
    { user, filled, hash }: { readonly user: string; readonly filled: Filled; readonly hash?: string },
  ): Sent =>
    deliver({
      kind: 'interactive',
      payload: {
        ...common,
        type: 'block_actions',
        user: who(user),
        trigger_id: triggerOf(desk),
        container: { type: 'view', view_id: held.id },
        view: described(held, filled, hash),
        actions: actions(held, actionId, value),
      },
    });

  const openForm = (): OpenView => {
    const held = [...desk.views.values()].at(-1);
    if (held === undefined) throw new Error('no form is open');
    return held;
  };

  return {
    /** The hash of the form as it stands: what a person sees of it may be older. */
    formHash: (): string => openForm().hash,

    /** Fills one more field of the form, which tells the app at once. */
    fill: (actionId: string, filled: Filled, user = 'U0ADA', hash?: string): Sent =>
      interact(openForm(), actionId, filled[actionId] ?? '', {
        user,
        filled,
        ...(hash === undefined ? {} : { hash }),
      }),

    /** What a type-ahead asks of the app; the answer is what it acknowledges with. */
    typeAhead: (actionId: string, value: string, user = 'U0ADA'): Sent => {
      const held = openForm();
      const { blockId, element } = elementIn(shownIn(held), actionId);
      const least = Number(element['min_query_length'] ?? 3);
      if (value.length < least) throw new Error(`the platform asks only from ${least} characters on`);
      const asked = deliver({
        kind: 'interactive',
        payload: {
          ...common,
          type: 'block_suggestion',
          user: who(user),
          container: { type: 'view', view_id: held.id },
          view: described(held, {}),
          action_id: actionId,
          block_id: blockId,
          value,
        },
      });
      const checked = asked.acknowledged.then((answer) => {
        const { options } = offered.parse(typeof answer === 'string' ? JSON.parse(answer) : answer);
        if (options.length > 0)
          desk.records.limitFaults.push(
            ...viewFaults(formWith({ ...element, type: 'static_select', options })),
          );
        return answer;
      });
      return { ...asked, acknowledged: checked };
    },

    /** Sends the form. A place that was chosen comes with a response address, whether or not the bot is there. */
    submit: (filled: Filled, user = 'U0ADA'): Sent => {
      const held = openForm();
      const urls = shownIn(held).blocks.flatMap((block) =>
        elementsOf(block).flatMap((element) => {
          const channel = filled[element.action_id];
          return element['response_url_enabled'] === true && channel !== undefined
            ? [
                {
                  block_id: String(block['block_id']),
                  action_id: element.action_id,
                  channel_id: channel,
                  response_url: responses.newAddress(channel, user, null),
                },
              ]
            : [];
        }),
      );
      return deliver({
        kind: 'interactive',
        payload: {
          ...common,
          type: 'view_submission',
          user: who(user),
          trigger_id: triggerOf(desk),
          view: described(held, filled),
          response_urls: urls,
        },
      });
    },

    /** Presses something on a person's home page, or chooses a line of its menu. */
    pressHome: (actionId: string, value: string, user = 'U0ADA'): Sent => {
      const held = desk.homes.get(user);
      if (held === undefined) throw new Error(`${user} has no home page`);
      return interact(held, actionId, value, { user, filled: {} });
    },
  };
};
