import type { Converse, Pressing, Spoken } from '../conversation.ts';
import type { Desk } from '../desk.ts';

/** What answers the presses of one kind of button. `ask` is the way of any question that was typed. */
export type PressHandler = (
  desk: Desk,
  pressing: Pressing,
  ask: Converse['ask'],
) => Promise<readonly Spoken[]>;
