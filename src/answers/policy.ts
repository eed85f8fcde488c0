/** What the desk has decided once for all answers; the settings file is its only source. */
export type AnswerPolicy = {
  /** Trading days that make a year: trade practice, 252 unless the desk says otherwise. */
  readonly periodsPerYear: number;
  /** A mean closer to zero than this, as a decimal fraction a day, does not matter to the desk. */
  readonly smallestMeanThatMatters: number;
};
