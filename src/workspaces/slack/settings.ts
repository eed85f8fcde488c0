/** How what people say reaches the bot: over sockets that it opens itself, or as requests to its public address. */
export type Receiving =
  | { readonly mode: 'socket'; readonly appToken: string; readonly sockets: number }
  | { readonly mode: 'http'; readonly signingSecret: string; readonly host: string; readonly port: number };

/** What to do with a post of which nobody can know whether it stands: it may then be missing, or stand twice. */
export type WhenUnsure = 'leave' | 'repeat';

export type SlackSettings = {
  readonly botToken: string;
  readonly receiving: Receiving;
  /** The platform's address where it is not the usual one. */
  readonly apiUrl: string | null;
  readonly whenUnsure: WhenUnsure;
};

/** How long one call may take. An unsure post is looked for only once this and as much again has passed. */
export const callTimeoutMs = 10_000;
