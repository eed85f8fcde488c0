import type { App } from '@slack/bolt';
import { askFormId } from '../../../present/views/askForm.ts';
import type { Self } from '../lookup.ts';
import { answerPress, type Pressing } from '../press.ts';
import type { Feature } from '../scopes.ts';
import { checkForm, type Forming, offerTickers, openForm, submitForm } from './form.ts';
import { pressedHome, showHome } from './home.ts';
import { pinChosen, pinShortcutId } from './pinShortcut.ts';

export type Surfacing = Pressing & Forming & { readonly self: Self };

/** The callback id of the global shortcut. */
export const askShortcutId = 'ask_form';

const hearShortcuts = (app: App, surfacing: Surfacing): void => {
  app.shortcut({ type: 'shortcut', callback_id: askShortcutId }, async ({ ack, body }) => {
    await Promise.all([ack(), openForm(surfacing, body)]);
  });
  app.shortcut({ type: 'message_action', callback_id: pinShortcutId }, async ({ ack, body }) => {
    await ack();
    await pinChosen(surfacing, body);
  });
  app.options<'block_suggestion'>('ticker', async ({ ack, body }) => {
    await ack({ options: [...(await offerTickers(surfacing, body))] });
  });
  app.view({ type: 'view_submission', callback_id: askFormId }, async ({ ack, body }) => {
    await submitForm(surfacing, body, (verdict) => (verdict === null ? ack() : ack(verdict)));
  });
};

/** Buttons, menus, shortcuts, the form and the home page. */
export const listenSurfaces = (app: App, features: ReadonlySet<Feature>, surfacing: Surfacing): void => {
  if (features.has('slashCommand')) hearShortcuts(app, surfacing);

  app.action(/[\s\S]*/, async ({ body, ack }) => {
    await ack();
    if ('view' in body && body.view?.type === 'modal') await checkForm(surfacing, body);
    else if (!(await pressedHome(surfacing, body))) await answerPress(surfacing, body);
  });

  app.event('app_home_opened', async ({ event, body }) => {
    await showHome(surfacing, event, body.team_id);
  });
};
