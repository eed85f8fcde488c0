/** Lets other work of this thread run between two slices of a long computation. */
export const breathe = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

/** Rows to be worked through between two breaths: a few milliseconds each. */
export const rowsPerBreath = 262_144;
