import { webApi } from '@slack/bolt';
import { afterEach, describe, expect, it } from 'vitest';
import { silentLog } from '../../../src/workspaces/slack/log.ts';
import { startListener } from './listener.ts';
import { startPlatform } from './start.ts';

const running: { readonly stop: () => Promise<void> }[] = [];
afterEach(async () => {
  for (const each of running.splice(0)) await each.stop();
});

const setUp = async (subscriptions: readonly string[] = []) => {
  const platform = await startPlatform({ subscriptions });
  const app = await startListener();
  running.push(platform, app);
  platform.sendTo(app.url);
  const client = new webApi.WebClient(platform.botToken, {
    slackApiUrl: platform.apiUrl,
    retryConfig: { retries: 0 },
    logger: silentLog,
  });
  const refusalOf = async (method: string, args: Record<string, unknown>): Promise<unknown> =>
    client.apiCall(method, args).then(
      () => 'ok',
      (error: unknown) => (error instanceof webApi.WebAPIPlatformError ? error.data.error : error),
    );
  const heard = async (): Promise<unknown> => JSON.parse((await app.requests.next()).body).event;
  return { platform, app, client, refusalOf, heard };
};

describe('channels and people that change', () => {
  it('are told of only to an app that is subscribed to it', async () => {
    const { platform, heard, app } = await setUp(['channel_archive', 'user_change', 'pin_removed']);
    platform.share('C0DESK', 'external');
    platform.archive('C0DESK');
    expect(await heard()).toMatchObject({ type: 'channel_archive', channel: 'C0DESK' });
    platform.deactivate('U0ADA');
    expect(await heard()).toMatchObject({ type: 'user_change', user: { id: 'U0ADA', deleted: true } });
    expect(app.requests.all).toHaveLength(2);
  });

  it('and a channel’s new id leaves nothing behind the old one', async () => {
    const { platform, refusalOf, heard, client } = await setUp(['channel_id_changed']);
    await client.chat.postMessage({ channel: 'C0DESK', text: 'one' });
    platform.changeId('C0DESK', 'C0NEW');
    expect(await heard()).toMatchObject({ old_channel_id: 'C0DESK', new_channel_id: 'C0NEW' });
    expect(await refusalOf('conversations.info', { channel: 'C0DESK' })).toBe('channel_not_found');
    expect((await client.conversations.history({ channel: 'C0NEW' })).messages).toHaveLength(1);
  });

  it('tell nothing of an invitation to another company', async () => {
    const { platform, client } = await setUp(['channel_shared', 'channel_unshared']);
    expect(platform.share('C0DESK', 'pending')).toEqual([]);
    const { channel } = await client.conversations.info({ channel: 'C0DESK' });
    expect(channel).toMatchObject({ is_pending_ext_shared: true, is_ext_shared: false });
  });

  it('make a person who is named as a channel reachable directly, until they leave', async () => {
    const { platform, client, refusalOf } = await setUp();
    expect((await client.chat.postMessage({ channel: 'U0ADA', text: 'hello' })).channel).toBe('D0ADA');
    platform.deactivate('U0ADA');
    expect(await refusalOf('chat.postMessage', { channel: 'U0ADA', text: 'hello' })).toBe(
      'channel_not_found',
    );
  });

  it('are listed page by page', async () => {
    const { client } = await setUp();
    const first = await client.users.list({ limit: 2 });
    const cursor = first.response_metadata?.next_cursor ?? '';
    const second = await client.users.list({ limit: 2, cursor });
    const ids = [...(first.members ?? []), ...(second.members ?? [])].map(({ id }) => id);
    expect(ids).toEqual(['U0ADA', 'U0BEN', 'U0GUS']);
    expect(second.response_metadata?.next_cursor).toBe('');
  });
});
