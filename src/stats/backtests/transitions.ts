/** Counts of day pairs by whether the earlier and the later day were exceedances (1) or not (0). */
export type Transitions = {
  readonly n00: number;
  readonly n01: number;
  readonly n10: number;
  readonly n11: number;
};

/**
 * How often does an exceedance follow an exceedance, and how often does it follow a quiet day?
 *
 * Convention: the first index is the day before: n01 counts quiet days followed by an exceedance; the T days make T − 1 pairs.
 * Domain: one entry a day, 1 for an exceedance and 0 for none; at least one day.
 * Units: days in, counts out.
 * Edges: a single day has no pair, all four counts are 0.
 * Source: Christoffersen 1998, International Economic Review 39, section 3.2.
 * Example: transitionsOf(Uint8Array.of(0, 1, 1, 0)) is { n00: 0, n01: 1, n10: 1, n11: 1 }.
 */
export const transitionsOf = (hits: Uint8Array): Transitions => {
  const counts = [0, 0, 0, 0];
  for (let day = 1; day < hits.length; day += 1) {
    const cell = 2 * (hits[day - 1] as number) + (hits[day] as number);
    counts[cell] = (counts[cell] as number) + 1;
  }
  const [n00 = 0, n01 = 0, n10 = 0, n11 = 0] = counts;
  return { n00, n01, n10, n11 };
};
