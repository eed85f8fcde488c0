/** The closed list of reasons for which a question, a file or a figure is refused, each with its meaning. */
export const problemCodes = {
  // the question
  unreadableWords: 'words that the question language does not know',
  noVerb: 'no verb was found',
  severalVerbs: 'more than one verb was found',
  verbNotBuilt: 'a verb of the language that cannot be asked yet',
  noTicker: 'the verb needs a ticker and none was given',
  tooManyTickers: 'more tickers than the verb takes',
  unknownTicker: 'a ticker that is not in the feed',
  ambiguous: 'words that can be read in more than one way',
  repeated: 'the same thing was said twice, or twice differently',
  notForVerb: 'words that this verb does not take',
  missingPart: 'the verb needs something that was not said',
  levelOutside: 'a level outside its range',
  sizeOutside: 'a size outside its range',
  badDate: 'a date that does not exist or is not written as asked',
  badTime: 'a time of day that does not exist or a time zone that is not known',
  tooManyLines: 'more questions in one message than are answered',
  messageTooLong: 'a message longer than is read',
  // the data a question meets
  windowEmpty: 'the window holds no return',
  windowTooLong: 'a window longer than the history',
  tooFewReturns: 'fewer returns than the figure needs',
  priceDoesNotMove: 'the price does not move in the window',
  noCommonDates: 'two tickers share too few dates',
  currencyMismatch: 'an amount in a currency other than the ticker’s',
  quarantined: 'a ticker whose prices contradict themselves',
  feedMissing: 'no usable price file',
  // a figure
  notEnoughTail: 'too few returns beyond the level to carry a tail figure',
  likelihoodUnbounded: 'repeated returns make the likelihood unbounded',
  fitNotConverged: 'a fit that did not reach its stopping rule',
  resamplesUnusable: 'resamples that do not surround the estimate, so that no interval can be read from them',
  meanNotFinite: 'a tail so heavy that its mean does not exist',
  shapeOutside: 'a tail shape outside the range in which its estimator works',
  varianceNotStationary: 'a volatility process without a finite long-run variance',
  // files and settings
  fileUnreadable: 'a file that cannot be opened or read',
  fileUnwritable: 'a file that cannot be written',
  columnMissing: 'a column that was asked for is not in the file',
  valueUnreadable: 'a cell that is not the kind of value its column holds',
  fileEmpty: 'a file without a row',
  fileChanging: 'a file that is still being written',
  pricesLost: 'a new price file that lacks prices which the one before had',
  settingWrong: 'a setting that is missing, unknown or out of range',
  tokenMissing: 'a token that the workspace needs is not set',
  platformUnreachable: 'the workspace platform does not answer',
  // records
  storeUnavailable: 'the store of records cannot be read or written',
  unknownRecord: 'no such answer on record, or none that may be shown here',
  unknownSubscription: 'no such digest or watch, or none that may be shown here',
  notPermitted: 'not permitted here',
} as const;

export type ProblemCode = keyof typeof problemCodes;

/** Half-open range of UTF-16 code units in the text as it was read. */
export type Position = { readonly start: number; readonly end: number };

/**
 * Why something was refused. `message` says what was wrong, with the value and its unit, then what to do.
 * `suggestion` is the nearest question that would work, ready to send. `needs` is the count that would be enough,
 * in the unit that the message names.
 */
export type Problem = {
  readonly code: ProblemCode;
  readonly message: string;
  readonly position: Position | null;
  readonly suggestion: string | null;
  readonly needs: number | null;
};

export const problem = (
  code: ProblemCode,
  message: string,
  more: Partial<Pick<Problem, 'position' | 'suggestion' | 'needs'>> = {},
): Problem => ({
  code,
  message,
  position: more.position ?? null,
  suggestion: more.suggestion ?? null,
  needs: more.needs ?? null,
});
