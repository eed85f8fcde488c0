/** Words that do not show themselves when they are printed, logged or turned into JSON. */
export type Secret = { readonly reveal: () => string };

export const secret = (value: string): Secret => ({ reveal: () => value });
