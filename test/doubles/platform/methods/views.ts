import { z } from 'zod';
import { viewFaults } from '../../../../src/present/limits/viewFaults.ts';
import limits from '../../../fixtures/platform/limits.json' with { type: 'json' };
import { needed, Refused, words } from '../arguments.ts';
import { blockProblems } from '../blocks.ts';
import type { Desk, Method, Methods, OpenView } from '../desk.ts';
import type { Arguments } from '../records.ts';

const label = (characters: number) =>
  z.looseObject({ type: z.literal('plain_text'), text: z.string().min(1).max(characters) });

const shape = z.looseObject({
  type: z.enum(['modal', 'home']),
  blocks: z.array(z.unknown()),
  title: label(limits.view.title).optional(),
  submit: label(limits.view.submitLabel).optional(),
  close: label(limits.view.closeLabel).optional(),
  private_metadata: z.string().max(limits.view.privateMetadata).optional(),
  callback_id: z.string().max(limits.view.callbackId).optional(),
});

const checked = (desk: Desk, args: Arguments, type: 'modal' | 'home') => {
  desk.records.limitFaults.push(...viewFaults(args['view']));
  const read = shape.safeParse(args['view']);
  const problems = read.success
    ? blockProblems(read.data.blocks, 'view')
    : read.error.issues.map((issue) => issue.message);
  if (!read.success || problems.length > 0 || read.data.type !== type)
    throw new Refused('invalid_arguments', problems);
  if (type === 'modal' && read.data.title === undefined) throw new Refused('invalid_arguments');
  if (JSON.stringify(read.data).length > limits.view.bytes) throw new Refused('view_too_large');
  return read.data;
};

const spendTrigger = (desk: Desk, id: string): void => {
  const trigger = desk.triggers.get(id);
  if (trigger === undefined) throw new Refused('invalid_trigger_id');
  if (trigger.used) throw new Refused('exchanged_trigger_id');
  if (desk.workspace.clock.nowMs() - trigger.bornMs > limits.events.triggerIdMs)
    throw new Refused('expired_trigger_id');
  trigger.used = true;
};

const shown = (view: OpenView) => ({ view: { id: view.id, hash: view.hash } });

const open: Method = (desk, args) => {
  const view = checked(desk, args, 'modal');
  spendTrigger(desk, needed(args, 'trigger_id'));
  const opened = { id: desk.newId('V'), hash: desk.newId('h'), view };
  desk.views.set(opened.id, opened);
  desk.records.views.add({ kind: 'open', view });
  return shown(opened);
};

const replace = (desk: Desk, held: OpenView, args: Arguments, view: unknown): void => {
  const hash = words(args, 'hash');
  if (hash !== null && hash !== held.hash) throw new Refused('hash_conflict');
  held.hash = desk.newId('h');
  held.view = view;
};

const update: Method = (desk, args) => {
  const held = desk.views.get(needed(args, 'view_id'));
  if (held === undefined) throw new Refused('not_found');
  const view = checked(desk, args, 'modal');
  replace(desk, held, args, view);
  desk.records.views.add({ kind: 'update', view });
  return shown(held);
};

const publish: Method = (desk, args) => {
  const user = needed(args, 'user_id');
  if (!desk.workspace.people.has(user)) throw new Refused('user_not_found');
  const view = checked(desk, args, 'home');
  const held = desk.homes.get(user) ?? { id: desk.newId('V'), hash: '', view };
  replace(desk, held, held.hash === '' ? {} : args, view);
  desk.homes.set(user, held);
  desk.records.views.add({ kind: 'publish', view });
  return shown(held);
};

export const views: Methods = { 'views.open': open, 'views.update': update, 'views.publish': publish };
