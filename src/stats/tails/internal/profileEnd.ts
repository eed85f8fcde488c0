/** The profile log-likelihood and its slope at one value of the figure; null where it could not be had. */
export type ProfileAt = (figure: number) => { readonly value: number; readonly slope: number } | null;

export type ProfileSearch = {
  readonly profile: ProfileAt;
  /** The figure at the highest point, and the log-likelihood there. */
  readonly estimate: number;
  readonly highest: number;
  /** Square root of the chi-square quantile: how far the signed root of the likelihood ratio may go. */
  readonly reach: number;
  /** First guess of the distance to the end, above 0. */
  readonly firstDistance: number;
  readonly direction: -1 | 1;
  /** The figure never goes beyond this; ±Infinity where it is free. */
  readonly bound: number;
};

export type ProfileEnd =
  | { readonly kind: 'end'; readonly figure: number }
  | { readonly kind: 'bound' }
  | { readonly kind: 'notFound' };

const mostEvaluations = 80;
const mostGrowth = 4;
/** On the signed root, where one unit is one standard error. */
const tolerance = 1e-10;

/** Distances from the estimate. `failed`: the outer one could not be evaluated, so the end need not lie between them. */
type Bracket = { inside: number; outside: number; failed: boolean };

/** Between the ends in the geometric sense where they lie far apart, so that distances of any size are reached. */
const splitOf = ({ inside, outside }: Bracket): number =>
  outside > 4 * inside && inside > 0 ? Math.sqrt(inside * outside) : (inside + outside) / 2;

/** Newton's next distance where it stays well inside the bracket, else a split; outward it grows at most fourfold. */
const nextDistance = (newton: number, bracket: Bracket, from: number): number => {
  if (bracket.outside === Number.POSITIVE_INFINITY) {
    const furthest = mostGrowth * from;
    return newton > from ? Math.min(newton, furthest) : furthest;
  }
  return newton > bracket.inside && newton < bracket.outside ? newton : splitOf(bracket);
};

/**
 * Where does the profile fall by half of reach² below its highest value, going one way from the estimate?
 * The root of 2·(highest − profile) is nearly a straight line in the figure, so Newton's method on it, held inside a
 * bracket, needs a few evaluations. Always ends: after a fixed number of evaluations the answer is that none was found.
 */
export const findProfileEnd = (search: ProfileSearch): ProfileEnd => {
  const { profile, estimate, highest, reach, direction } = search;
  const furthest = Math.abs(search.bound - estimate);
  if (furthest === 0) return { kind: 'bound' };
  const bracket: Bracket = { inside: 0, outside: Number.POSITIVE_INFINITY, failed: false };
  let distance = Math.min(search.firstDistance, furthest);
  for (let evaluation = 0; evaluation < mostEvaluations; evaluation += 1) {
    const figure = distance === furthest ? search.bound : estimate + direction * distance;
    const at = profile(figure);
    if (at === null) {
      bracket.outside = distance;
      bracket.failed = true;
      distance = splitOf(bracket);
      continue;
    }
    const root = Math.sqrt(Math.max(0, 2 * (highest - at.value)));
    const missing = reach - root;
    if (Math.abs(missing) <= tolerance) return { kind: 'end', figure };
    if (missing > 0) bracket.inside = distance;
    else {
      bracket.outside = distance;
      bracket.failed = false;
    }
    if (missing > 0 && distance === furthest) return { kind: 'bound' };
    const growth = (-direction * at.slope) / root;
    const newton = growth > 0 ? distance + missing / growth : Number.NaN;
    const next = Math.min(nextDistance(newton, bracket, distance), furthest);
    if (next === distance || bracket.inside >= (1 - 1e-12) * bracket.outside)
      return bracket.failed ? { kind: 'notFound' } : { kind: 'end', figure };
    distance = next;
  }
  return { kind: 'notFound' };
};
