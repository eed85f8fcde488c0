import type { Desk } from './desk.ts';

/** A trigger lets the app open one form within three seconds. */
export const triggerOf = (desk: Desk): string => {
  const id = desk.newId('X');
  desk.triggers.set(id, { bornMs: desk.workspace.clock.nowMs(), used: false });
  return id;
};
