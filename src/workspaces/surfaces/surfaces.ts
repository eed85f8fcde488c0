import type { Desk } from '../desk.ts';
import { type AskForm, createAskForm } from './askForm.ts';
import { createHome, type Home } from './home.ts';

/** What people see of the bot beside its answers. */
export type Surfaces = {
  readonly form: AskForm;
  readonly home: Home;
  /** Follow-ups in threads are answered without a mention too. */
  readonly listensInThreads: boolean;
};

export const createSurfaces = (desk: Desk, listensInThreads: boolean): Surfaces => ({
  form: createAskForm(desk),
  home: createHome(desk),
  listensInThreads,
});
