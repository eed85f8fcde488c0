/** Samples of every parametric bootstrap here. */
export const parametricReplicates = 999;
