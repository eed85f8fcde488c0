import { channelEvents } from './places/newsOf.ts';
import type { Logger } from './ports.ts';

/** What the bot does, and the scopes of its token without which it cannot. */
export const featureScopes = {
  mention: ['app_mentions:read', 'chat:write'],
  directMessage: ['im:history', 'chat:write'],
  slashCommand: ['commands'],
  members: ['users:read'],
  channelKind: ['channels:read', 'groups:read'],
  lookUp: ['channels:history', 'groups:history', 'im:history'],
  followUp: ['channels:history', 'groups:history'],
  pin: ['pins:write', 'pins:read'],
  picture: ['files:write'],
  home: [],
} as const;

export type Feature = keyof typeof featureScopes;

/** What each feature has to hear of. */
export const featureEvents = {
  mention: ['app_mention'],
  directMessage: ['message.im'],
  slashCommand: [],
  members: ['user_change'],
  channelKind: channelEvents,
  lookUp: [],
  followUp: ['message.channels', 'message.groups'],
  pin: ['pin_removed'],
  picture: [],
  home: ['app_home_opened'],
} as const satisfies Readonly<Record<Feature, readonly string[]>>;

const features = Object.keys(featureScopes).filter((name): name is Feature => name in featureScopes);

/** What follows where it hangs together in a way that the name of a feature does not tell: what is not known is denied. */
const consequences: Readonly<Partial<Record<Feature, string>>> = {
  members:
    ' Until then only people and channels are answered that permissions.people and sharedChannels name.',
  channelKind: ' Until then only channels are answered that permissions.sharedChannels names.',
};

/**
 * The features that the token carries. Each of the others is named in the log with what it lacks. A platform that does
 * not say which scopes the token has leaves every feature on.
 */
export const featuresOf = (scopes: readonly string[] | null, log: Logger): ReadonlySet<Feature> => {
  if (scopes === null) {
    log.warn('The platform did not say which scopes the token has: every feature stays on, unchecked.');
    return new Set(features);
  }
  const on = new Set(features);
  for (const feature of features) {
    const missing = featureScopes[feature].filter((scope: string) => !scopes.includes(scope));
    if (missing.length === 0) continue;
    on.delete(feature);
    log.warn(
      `The feature ${feature} is off: the token lacks ${missing.join(', ')}. Add it to the app and install it again.${consequences[feature] ?? ''}`,
    );
  }
  return on;
};
