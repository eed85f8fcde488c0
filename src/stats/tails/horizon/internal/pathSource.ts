import type { Random } from '../../../../terms/random.ts';

/** Fills `into` with the returns of consecutive days, as many as it holds, from one random source. Allocates nothing. */
export type PathSource = (random: Random, into: Float64Array) => void;

/** How a model makes the days to come, and how unsure it is of itself. */
export type HorizonModel = {
  readonly paths: PathSource;
  /** The mean daily return of the trade's shortcut. */
  readonly drift: number;
  /** False where a day's loss has no mean. */
  readonly lossHasMean: boolean;
  /** The paths under parameters drawn from what the returns leave open; null where a draw could not be fitted. */
  readonly redraw: (random: Random) => PathSource | null;
};
