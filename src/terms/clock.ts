/** Milliseconds since 1970-01-01T00:00:00Z. */
export type InstantMs = number;

/** Where the present instant comes from. Only start/ makes one from the machine's clock. */
export type Clock = { readonly nowMs: () => InstantMs };
