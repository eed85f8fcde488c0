import { words } from './arguments.ts';
import type { Desk } from './desk.ts';
import type { Arguments } from './records.ts';

const byMethod: Readonly<Record<string, string>> = {
  'chat.postMessage': 'chat:write',
  'chat.update': 'chat:write',
  'chat.delete': 'chat:write',
  'chat.postEphemeral': 'chat:write',
  'users.info': 'users:read',
  'users.list': 'users:read',
  'pins.add': 'pins:write',
  'pins.remove': 'pins:write',
  'pins.list': 'pins:read',
  'files.getUploadURLExternal': 'files:write',
  'files.completeUploadExternal': 'files:write',
};

const byChannelKind = {
  public: { read: 'channels:read', history: 'channels:history' },
  private: { read: 'groups:read', history: 'groups:history' },
  direct: { read: 'im:read', history: 'im:history' },
} as const;

/** The scope that a call needs; null where any token will do. */
export const scopeNeeded = (desk: Desk, method: string, args: Arguments): string | null => {
  const use = /^conversations\.(history|replies)$/.test(method)
    ? 'history'
    : /^conversations\.(info|members)$/.test(method)
      ? 'read'
      : null;
  if (use === null) return byMethod[method] ?? null;
  const channel = desk.workspace.channels.get(words(args, 'channel') ?? '');
  return channel === undefined ? null : byChannelKind[channel.kind][use];
};
