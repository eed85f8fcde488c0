/** What is under way, so that a stop can wait for it. */
export type Work = {
  readonly track: <T>(run: () => Promise<T>) => Promise<T>;
  /** Resolves once nothing is under way. */
  readonly idle: () => Promise<void>;
  /** Nothing new is begun from now on. */
  readonly close: () => void;
};

export const makeWork = (): Work => {
  const running = new Set<Promise<unknown>>();
  let closed = false;
  return {
    track: (run) => {
      if (closed) return Promise.reject(new Error('the workspace is being left'));
      const task = run();
      running.add(task);
      const done = () => {
        running.delete(task);
      };
      task.then(done, done);
      return task;
    },
    idle: async () => {
      while (running.size > 0) await Promise.allSettled(running);
    },
    close: () => {
      closed = true;
    },
  };
};
