/** How long a test waits for something that should already be on its way before it says so by name. */
const guardMs = 10_000;

/** What arrived, in order, and a way to wait for the next one instead of sleeping. */
export type Tray<T> = {
  readonly all: readonly T[];
  readonly add: (item: T) => void;
  /** The first item that was not taken yet, as soon as there is one. */
  readonly next: () => Promise<T>;
};

export const makeTray = <T>(name: string): Tray<T> => {
  const all: T[] = [];
  const takers: ((item: T) => void)[] = [];
  let taken = 0;

  return {
    all,
    add: (item) => {
      all.push(item);
      const taker = takers.shift();
      if (taker === undefined) return;
      taken += 1;
      taker(item);
    },
    next: () => {
      const item = takers.length === 0 ? all[taken] : undefined;
      if (item !== undefined) {
        taken += 1;
        return Promise.resolve(item);
      }
      return new Promise((resolve, reject) => {
        const guard = setTimeout(
          () => reject(new Error(`nothing new among ${name} within ${guardMs} ms (${all.length} so far)`)),
          guardMs,
        );
        takers.push((arrived) => {
          clearTimeout(guard);
          resolve(arrived);
        });
      });
    },
  };
};
