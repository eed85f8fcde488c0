/** What the platform tells of the workspace itself. */
export type News =
  /** It was archived, shared, renamed, deleted or the like, or somebody joined or left it. */
  | { readonly kind: 'channelChanged'; readonly team: string; readonly channel: string }
  /** It has another id from now on. */
  | { readonly kind: 'channelMoved'; readonly team: string; readonly from: string; readonly to: string }
  | { readonly kind: 'personChanged'; readonly team: string; readonly person: string }
  /** A person took a pin off. */
  | { readonly kind: 'pinRemoved'; readonly team: string; readonly channel: string; readonly ts: string };
