import type { DigestRunner } from '../../digests/run/createRunner.ts';
import type { Time } from '../../workspaces/slack/ports.ts';

/** How often is looked for what falls due: a post is at most so late. */
export const lookEveryMs = 15_000;

/** Looks for what falls due until it is stopped. */
export const keepRunning = (
  runner: DigestRunner,
  time: Pick<Time, 'after'>,
): { readonly stop: () => Promise<void> } => {
  let stopped = false;
  let callOff = (): void => {};
  const look = async (): Promise<void> => {
    await runner.tick();
    if (stopped) return;
    callOff = time.after(lookEveryMs, () => {
      looking = look();
    });
  };
  let looking = look();
  return {
    stop: async () => {
      stopped = true;
      callOff();
      await looking;
    },
  };
};
