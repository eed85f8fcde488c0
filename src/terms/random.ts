/** A source of independent, uniformly distributed 32-bit whole numbers. */
export type Random = { readonly nextUint32: () => number };

/** One reproducible stream per replicate number, so that results do not depend on how work is shared out. */
export type RandomStreams = { readonly stream: (replicate: number) => Random };
