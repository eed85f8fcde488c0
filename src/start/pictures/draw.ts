import { Piscina } from 'piscina';
import type { Result } from '../../terms/result.ts';
import type { Drawing, Picture } from '../../workspaces/pictures.ts';
import type { PictureOrder } from './order.ts';

export type DrawingRoom = Drawing & { readonly close: () => Promise<void> };

const drawingBy = (run: (order: PictureOrder) => Promise<Result<Picture>>): Drawing => ({
  draw: (job, answers) => run({ kind: 'answers', job, answers }),
  drawData: (data) => run({ kind: 'data', data }),
});

/** A thread without work for this long ends, and the next picture waits for a new one to load. */
const idleTimeoutMs = 30 * 60_000;

/** Pictures are drawn one after the other in a thread of their own, which starts with the first. */
export const drawInThread = (workerFile = new URL('./worker.js', import.meta.url)): DrawingRoom => {
  let pool: Piscina<PictureOrder, Result<Picture>> | null = null;
  const opened = () => {
    pool ??= new Piscina({
      filename: workerFile.href,
      minThreads: 0,
      maxThreads: 1,
      idleTimeout: idleTimeoutMs,
    });
    return pool;
  };
  return {
    ...drawingBy((order) => opened().run(order)),
    close: async () => pool?.close(),
  };
};

/** Draws on the calling thread: for one-shot use, where nobody else waits. */
export const drawInline = (): DrawingRoom => ({
  ...drawingBy(async (order) => (await import('./worker.ts')).default(order)),
  close: async () => {},
});
