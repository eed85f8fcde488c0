import type { DigestRunner } from '../../digests/run/createRunner.ts';
import type { Time } from '../../workspaces/slack/ports.ts';

/** How often is looked for what falls due: a post is at most so late. */
export const lookEveryMs = 15_000;

const inWords = (error: unknown): string =>
  error instanceof Error ? (error.stack ?? error.message) : String(error);

/** Looks for what falls due until it is stopped. What breaks one look is told, and the next is taken all the same. */
export const keepRunning = (
  runner: DigestRunner,
  time: Pick<Time, 'after'>,
  tell: (message: string) => void,
): { readonly stop: () => Promise<void> } => {
  let stopped = false;
  let callOff = (): void => {};
  const look = async (): Promise<void> => {
    await runner.tick().catch((error: unknown) => tell(`Looking for what is due failed: ${inWords(error)}`));
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
