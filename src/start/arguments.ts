import { parseArgs } from 'node:util';

/** What may be said to every command on its command line. */
export type Arguments = {
  readonly config: string | null;
  readonly feed: string | null;
  readonly workspace: string | null;
  readonly records: string | null;
  readonly json: boolean;
  /** Keep the answer on record. */
  readonly keep: boolean;
  /** Which records an export holds, and in which form. */
  readonly ticker: string | null;
  readonly since: string | null;
  readonly csv: boolean;
  /** The file that the picture of the answer is written to. */
  readonly picture: string | null;
  /** The file that a conversation in the terminal is written to, or typed again from. */
  readonly record: string | null;
  readonly replay: string | null;
  readonly words: readonly string[];
};

/** Reads the command line, or says what is wrong with it. */
export const readArguments = (argv: readonly string[]): Arguments | { readonly wrong: string } => {
  try {
    const { values, positionals } = parseArgs({
      args: [...argv],
      allowPositionals: true,
      options: {
        config: { type: 'string' },
        feed: { type: 'string' },
        workspace: { type: 'string' },
        records: { type: 'string' },
        json: { type: 'boolean', default: false },
        keep: { type: 'boolean', default: false },
        ticker: { type: 'string' },
        since: { type: 'string' },
        csv: { type: 'boolean', default: false },
        picture: { type: 'string' },
        record: { type: 'string' },
        replay: { type: 'string' },
      },
    });
    return {
      config: values.config ?? null,
      feed: values.feed ?? null,
      workspace: values.workspace ?? null,
      records: values.records ?? null,
      json: values.json ?? false,
      keep: values.keep ?? false,
      ticker: values.ticker ?? null,
      since: values.since ?? null,
      csv: values.csv ?? false,
      picture: values.picture ?? null,
      record: values.record ?? null,
      replay: values.replay ?? null,
      words: positionals,
    };
  } catch (error) {
    return { wrong: error instanceof Error ? error.message : String(error) };
  }
};
