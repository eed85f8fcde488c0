import 'vega';

/** The library's types leave out the one place where it can be told how wide a text is. */
declare module 'vega' {
  export const textMetrics: { width: (item: object, text?: unknown) => number };
}
