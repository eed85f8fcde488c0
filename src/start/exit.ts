/** How a command ends: answered, refused with a reason, or broken. */
export const exitCodes = { answered: 0, broken: 1, refused: 2 } as const;
