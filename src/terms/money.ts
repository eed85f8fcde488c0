/** An amount of money in an ISO 4217 currency. Negative amounts are short positions. */
export type Money = { readonly amount: number; readonly currency: string };
