/** A word of a line. `start` and `end` are its place in the cleaned text; `quoted` where it stood in back-ticks. */
export type Word = {
  readonly text: string;
  readonly lower: string;
  readonly start: number;
  readonly end: number;
  /** Written in back-ticks and a ticker of the feed: then it is nothing but that ticker. */
  readonly quoted: boolean;
};

export const createWord = (text: string, start: number, quoted = false): Word => ({
  text,
  lower: text.toLowerCase(),
  start,
  end: start + text.length,
  quoted,
});
