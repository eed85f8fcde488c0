/**
 * Mutants that no test can tell from the source, each with the reason. `line` is a piece of the mutated line.
 */
export const equivalents = [];
