/** How much is read. What is longer is refused by name, never cut short silently. */
export const limits = {
  messageCharacters: 2000,
  questionsPerMessage: 3,
  tickersPerQuestion: 5,
  /** As many lines as still fit in one table of the workspace with their figures. */
  tickersPerDigest: 50,
  /** A word of the person is repeated to them up to this length. */
  shownCharacters: 40,
  suggestionsPerProblem: 3,
  /** A line with more words is no question with a slip in it: nothing near it is looked for. */
  wordsOfRepairedLine: 40,
  windowReturns: 1_000_000,
  /** A year of sessions: a simulated path beyond it says more about the model than about the price. */
  horizonDays: 250,
} as const;
