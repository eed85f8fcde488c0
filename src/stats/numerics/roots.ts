/** Where a search for a root ended. `root` is the better end of the last bracket. */
export type RootOutcome =
  | { readonly found: true; readonly root: number; readonly evaluations: number }
  | { readonly found: false; readonly reason: 'noSignChange' | 'notANumber' | 'tooManySteps' };

export type RootOptions = {
  /** The bracket is narrowed to this share of the root; never finer than two units in the last place. */
  readonly relativeTolerance?: number;
  /** … or to this width, whichever is wider; 1e-24 of the larger end unless told otherwise, for roots at zero. */
  readonly absoluteTolerance?: number;
  readonly maxEvaluations?: number;
};

/**
 * Finds a point where a continuous function changes sign between two points at which its signs differ.
 *
 * Convention: Chandrupatla's method, inverse quadratic interpolation where the three last points allow it and bisection
 * where they do not, so it never does worse than bisection by more than a constant.
 * Domain: low and high finite, in either order; infinite values of f count by their sign.
 * Unit: that of the argument.
 * Edges: an end at which f is exactly zero is the root; equal signs, a NaN value and running out of evaluations (default
 * 300) are outcomes, never a loop.
 * Source: Chandrupatla 1997, Advances in Engineering Software 28, 145-149.
 * Example: `findRoot((x) => x * x - 2, 0, 2)` finds 1.4142135623730951.
 */
export const findRoot = (
  f: (x: number) => number,
  low: number,
  high: number,
  options: RootOptions = {},
): RootOutcome => {
  const relativeTolerance = Math.max(options.relativeTolerance ?? 0, 2 * Number.EPSILON);
  const absoluteTolerance = options.absoluteTolerance ?? 1e-24 * Math.max(Math.abs(low), Math.abs(high));
  const maxEvaluations = options.maxEvaluations ?? 300;
  let older = low;
  let newest = high;
  let fOlder = f(older);
  let fNewest = f(newest);
  if (Number.isNaN(fOlder) || Number.isNaN(fNewest)) return { found: false, reason: 'notANumber' };
  if (fOlder === 0) return { found: true, root: older, evaluations: 2 };
  if (fNewest === 0) return { found: true, root: newest, evaluations: 2 };
  if (fOlder > 0 === fNewest > 0) return { found: false, reason: 'noSignChange' };
  let share = 0.5;
  for (let evaluations = 3; evaluations <= maxEvaluations; evaluations += 1) {
    const x = newest + share * (older - newest);
    const fx = f(x);
    if (Number.isNaN(fx)) return { found: false, reason: 'notANumber' };
    let dropped = newest;
    let fDropped = fNewest;
    if (fx > 0 !== fNewest > 0) {
      dropped = older;
      fDropped = fOlder;
      older = newest;
      fOlder = fNewest;
    }
    newest = x;
    fNewest = fx;
    const best = Math.abs(fNewest) < Math.abs(fOlder) ? newest : older;
    const leastShare =
      (relativeTolerance * Math.abs(best) + absoluteTolerance) / (2 * Math.abs(older - newest));
    if (fx === 0) return { found: true, root: x, evaluations };
    if (leastShare > 0.5) return { found: true, root: best, evaluations };
    share = nextShare(newest, older, dropped, fNewest, fOlder, fDropped);
    share = Math.min(1 - leastShare, Math.max(leastShare, share));
  }
  return { found: false, reason: 'tooManySteps' };
};

/** Where between the newest and the older point to look next, as a share of their distance. */
const nextShare = (a: number, b: number, c: number, fa: number, fb: number, fc: number): number => {
  const xi = (a - b) / (c - b);
  const phi = (fa - fb) / (fc - fb);
  const trusted = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi;
  if (!trusted) return 0.5;
  const share =
    (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb));
  return Number.isFinite(share) ? share : 0.5;
};

export type Bracket = { readonly low: number; readonly high: number };

export type BracketOptions = {
  /** The bracket never grows beyond these. */
  readonly least?: number;
  readonly greatest?: number;
  readonly maxDoublings?: number;
};

/**
 * Widens an interval until the signs of f at its ends differ; null when that does not happen within the bounds.
 *
 * Convention: the end at which |f| is smaller moves away from the other by twice the last width, until it stands on its
 * bound; then the other end moves.
 * Domain: low < high, both within the bounds.
 * Edges: NaN at an end gives null; at most 60 doublings unless told otherwise.
 * Example: `expandBracket((x) => x - 100, 0, 1)` is an interval that holds 100.
 */
export const expandBracket = (
  f: (x: number) => number,
  low: number,
  high: number,
  options: BracketOptions = {},
): Bracket | null => {
  const least = options.least ?? -Number.MAX_VALUE;
  const greatest = options.greatest ?? Number.MAX_VALUE;
  const maxDoublings = options.maxDoublings ?? 60;
  let left = low;
  let right = high;
  let fLeft = f(left);
  let fRight = f(right);
  for (let doubling = 0; doubling <= maxDoublings; doubling += 1) {
    if (Number.isNaN(fLeft) || Number.isNaN(fRight)) return null;
    if (fLeft === 0 || fRight === 0 || fLeft > 0 !== fRight > 0) return { low: left, high: right };
    const width = 2 * (right - left);
    const leftStuck = left <= least;
    const rightStuck = right >= greatest;
    if (leftStuck && rightStuck) return null;
    if (rightStuck || (!leftStuck && Math.abs(fLeft) < Math.abs(fRight))) {
      left = Math.max(least, left - width);
      fLeft = f(left);
    } else {
      right = Math.min(greatest, right + width);
      fRight = f(right);
    }
  }
  return null;
};
