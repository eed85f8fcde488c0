/** Room for so many at a time; the others wait in order. */
export type Slots = { readonly use: <T>(run: () => Promise<T>) => Promise<T> };

export const makeSlots = (most: number): Slots => {
  const queue: (() => void)[] = [];
  let used = 0;

  const enter = (): Promise<void> => {
    if (used < most) {
      used += 1;
      return Promise.resolve();
    }
    return new Promise((resolve) => queue.push(resolve));
  };

  /** A slot that somebody waits for is handed on rather than given back. */
  const leave = (): void => {
    const next = queue.shift();
    if (next === undefined) used -= 1;
    else next();
  };

  return {
    use: async (run) => {
      await enter();
      try {
        return await run();
      } finally {
        leave();
      }
    },
  };
};
