/** Lets at most so many pieces of work be under way; the others wait in the order in which they came. */
export const createInTurn = (most: number): (<T>(work: () => Promise<T>) => Promise<T>) => {
  let underWay = 0;
  const waiting: (() => void)[] = [];
  const enter = async (): Promise<void> => {
    // a place that is handed over stays taken
    if (underWay >= most) await new Promise<void>((resolve) => waiting.push(resolve));
    else underWay += 1;
  };
  const leave = (): void => {
    const next = waiting.shift();
    if (next === undefined) underWay -= 1;
    else next();
  };
  return async (work) => {
    await enter();
    try {
      return await work();
    } finally {
      leave();
    }
  };
};
