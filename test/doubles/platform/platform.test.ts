import { verifySlackRequest, webApi } from '@slack/bolt';
import { afterEach, describe, expect, it } from 'vitest';
import { silentLog } from '../../../src/workspaces/slack/log.ts';
import { startListener } from './listener.ts';
import { type PlatformOptions, startPlatform } from './start.ts';

const running: { readonly stop: () => Promise<void> }[] = [];

afterEach(async () => {
  for (const each of running.splice(0)) await each.stop();
});

/** The platform with its own client, and an app that only listens. */
const setUp = async (options: PlatformOptions = {}) => {
  const platform = await startPlatform({ breaksLimits: true, ...options });
  const app = await startListener();
  running.push(platform, app);
  platform.sendTo(app.url);
  const client = new webApi.WebClient(platform.botToken, {
    slackApiUrl: platform.apiUrl,
    retryConfig: { retries: 0 },
    rejectRateLimitedCalls: true,
    logger: silentLog,
  });
  const refusalOf = async (method: string, args: Record<string, unknown>): Promise<unknown> =>
    client.apiCall(method, args).then(
      () => 'ok',
      (error: unknown) => (error instanceof webApi.WebAPIPlatformError ? error.data.error : error),
    );
  return { platform, app, client, refusalOf };
};

const channel = 'C0DESK';
const metadata = { event_type: 'leadsman_delivery', event_payload: { id: 'one' } };
const cells = (...texts: readonly string[]) => texts.map((text) => ({ type: 'raw_text', text }));
const table = (...rows: readonly unknown[]) => ({ type: 'table', rows });

describe('messages', () => {
  it('carry metadata only where it is asked for', async () => {
    const { client } = await setUp();
    await client.chat.postMessage({ channel, text: 'one', metadata });
    const bare = await client.conversations.history({ channel });
    const whole = await client.conversations.history({ channel, include_all_metadata: true });
    expect(bare.messages?.[0]).not.toHaveProperty('metadata');
    expect(whole.messages?.[0]).toMatchObject({ metadata });
  });

  it('in a thread are not in the history, and the thread holds its first message in any span', async () => {
    const { client } = await setUp();
    const { ts = '' } = await client.chat.postMessage({ channel, text: 'first' });
    await client.chat.postMessage({ channel, text: 'reply', thread_ts: ts });
    const history = await client.conversations.history({ channel });
    expect(history.messages?.map(({ text }) => text)).toEqual(['first']);
    const later = await client.conversations.replies({ channel, ts, oldest: '9999999999' });
    expect(later.messages?.map(({ text }) => text)).toEqual(['first']);
  });

  it('come in pages', async () => {
    const { platform, client } = await setUp();
    for (const text of ['1', '2', '3']) platform.say({ channel, text });
    const first = await client.conversations.history({ channel, limit: 2 });
    const cursor = first.response_metadata?.next_cursor ?? '';
    const second = await client.conversations.history({ channel, limit: 2, cursor });
    expect([first, second].map(({ messages }) => messages?.map(({ text }) => text))).toEqual([
      ['3', '2'],
      ['1'],
    ]);
  });

  it('keep their blocks when only the text is changed, and lose them to an empty list', async () => {
    const { platform, client } = await setUp();
    const { ts = '' } = await client.chat.postMessage({
      channel,
      text: 'one',
      blocks: [{ type: 'divider' }],
      metadata,
    });
    await client.chat.update({ channel, ts, text: 'two' });
    expect(platform.workspace.messageAt(channel, ts)).toMatchObject({
      text: 'two',
      blocks: [{ type: 'divider' }],
      metadata,
    });
    await client.chat.update({ channel, ts, text: 'three', blocks: [] });
    expect(platform.workspace.messageAt(channel, ts)?.blocks).toEqual([]);
  });

  it('of others are not the bot’s to change', async () => {
    const { platform, refusalOf } = await setUp();
    const { ts } = platform.say({ channel, text: 'mine' });
    expect(await refusalOf('chat.update', { channel, ts, text: 'yours' })).toBe('cant_update_message');
    expect(await refusalOf('chat.delete', { channel, ts })).toBe('cant_delete_message');
    expect(await refusalOf('chat.update', { channel, ts: '1.1', text: 'x' })).toBe('message_not_found');
  });

  it.each([
    ['C0NOWHERE', 'channel_not_found'],
    ['C0ELSEWHERE', 'not_in_channel'],
    ['C0OLD', 'is_archived'],
  ])('to %s are refused: %s', async (where, code) => {
    const { refusalOf } = await setUp();
    expect(await refusalOf('chat.postMessage', { channel: where, text: 'x' })).toBe(code);
  });

  it('for one person are shown in a thread only where somebody has replied', async () => {
    const { platform, client } = await setUp();
    const { ts } = platform.say({ channel, text: 'a thread' });
    const whisper = { channel, user: 'U0ADA', text: 'psst', thread_ts: ts };
    await client.chat.postEphemeral(whisper);
    platform.say({ channel, text: 'a reply', thread: ts });
    await client.chat.postEphemeral(whisper);
    expect(platform.ephemerals.all.map(({ shown }) => shown)).toEqual([false, true]);
  });

  it('are refused without the scope', async () => {
    const { refusalOf } = await setUp({ scopes: ['chat:write', 'channels:history'] });
    expect(await refusalOf('conversations.info', { channel })).toBe('missing_scope');
    expect(await refusalOf('conversations.history', { channel })).toBe('ok');
  });
});

describe('blocks', () => {
  const section = (text: string) => ({ type: 'section', text: { type: 'plain_text', text } });
  const text = { type: 'plain_text', text: 'x' };

  it.each([
    ['an empty cell', [table(cells('a', ''))]],
    ['a cell of the kind raw_number', [table([{ type: 'raw_number', value: 1 }])]],
    ['rows of unequal length', [table(cells('a', 'b'), cells('c'))]],
    ['21 columns', [table(cells(...Array.from({ length: 21 }, () => 'x')))]],
    ['101 rows', [table(...Array.from({ length: 101 }, () => cells('x')))]],
    ['10,001 characters in a table', [table(cells('x'.repeat(5_000), 'x'.repeat(5_001)))]],
    ['two tables', [table(cells('a')), table(cells('b'))]],
    ['51 blocks', Array.from({ length: 51 }, () => ({ type: 'divider' }))],
    ['3,001 characters in a section', [section('x'.repeat(3_001))]],
    ['no character in a section', [section('')]],
    ['a section of nothing', [{ type: 'section' }]],
    ['a property of the other kind of text', [{ type: 'section', text: { ...text, verbatim: true } }]],
    ['an unknown block', [{ type: 'banner' }]],
    ['a block id twice', ['a', 'a'].map((block_id) => ({ type: 'divider', block_id }))],
    [
      'an action id twice in a block',
      [{ type: 'actions', elements: ['a', 'a'].map((action_id) => ({ type: 'button', text, action_id })) }],
    ],
    ['a picture that was not uploaded', [{ type: 'image', alt_text: 'x', slack_file: { id: 'F1' } }]],
    ['a picture without alt text', [{ type: 'image', image_url: 'https://example.com/x.png' }]],
  ])('with %s are refused', async (_, blocks) => {
    const { refusalOf } = await setUp();
    expect(await refusalOf('chat.postMessage', { channel, text: 'x', blocks })).toBe('invalid_blocks');
  });

  it('within the limits are taken', async () => {
    const { refusalOf } = await setUp();
    const blocks = [
      section('x'.repeat(3_000)),
      table(cells('a', '–'), [{ type: 'raw_text', text: 'c' }, richCell]),
      { type: 'actions', elements: [{ type: 'button', text, action_id: 'a', value: 'v' }] },
    ];
    expect(await refusalOf('chat.postMessage', { channel, text: 'x', blocks })).toBe('ok');
  });

  it('hold no table on the home page', async () => {
    const { refusalOf } = await setUp();
    const publish = (blocks: unknown) =>
      refusalOf('views.publish', { user_id: 'U0ADA', view: { type: 'home', blocks } });
    expect(await publish([section('x')])).toBe('ok');
    expect(await publish([table(cells('a'))])).toBe('invalid_arguments');
  });

  const richCell = {
    type: 'rich_text',
    elements: [{ type: 'rich_text_section', elements: [{ type: 'text', text: 'd' }] }],
  };
});

describe('faults', () => {
  it('lose the answer of a post that was made', async () => {
    const { platform, client } = await setUp();
    platform.faults.next('chat.postMessage', { kind: 'dropped', accepted: true });
    await expect(client.chat.postMessage({ channel, text: 'one' })).rejects.toThrow(
      webApi.WebAPIRequestError,
    );
    expect(platform.posts.all).toHaveLength(1);
  });

  it('say for how long to wait', async () => {
    const { platform, client } = await setUp();
    platform.faults.next('chat.postMessage', { kind: 'limited', retryAfterSeconds: 7 });
    await expect(client.chat.postMessage({ channel, text: 'one' })).rejects.toMatchObject({ retryAfter: 7 });
    expect(platform.posts.all).toEqual([]);
  });
});

describe('what the app is told', () => {
  it('is signed so that the library takes it', async () => {
    const { platform, app } = await setUp();
    platform.mention({ channel, text: 'feed' });
    const { headers, body } = await app.requests.next();
    const signed = {
      signingSecret: platform.signingSecret,
      body,
      headers: {
        'x-slack-signature': String(headers['x-slack-signature']),
        'x-slack-request-timestamp': Number(headers['x-slack-request-timestamp']),
      },
    };
    expect(() => verifySlackRequest(signed)).not.toThrow();
    expect(() => verifySlackRequest({ ...signed, body: `${body} ` })).toThrow(/signature mismatch/);
  });

  it('comes again at once, after one and after five minutes, and then no more', async () => {
    const { platform, app } = await setUp();
    app.answerWith(500);
    const { sent } = platform.mention({ channel, text: 'feed' });
    await app.requests.next();
    expect((await app.requests.next()).headers['x-slack-retry-num']).toBe('1');
    for (const [delayMs, number] of [
      [60_000, '2'],
      [300_000, '3'],
    ] as const) {
      await platform.time.timerSet(delayMs);
      platform.time.advance(delayMs);
      expect((await app.requests.next()).headers['x-slack-retry-num']).toBe(number);
    }
    await platform.time.timerGone(3_000);
    expect(platform.time.waiting()).toEqual([]);
    expect(sent.map((each) => each.attempts())).toEqual([4]);
  });

  it('of an edited mention is the mention again, under its old stamp', async () => {
    const { platform, app } = await setUp();
    const said = platform.mention({ channel, text: 'feed' });
    await app.requests.next();
    platform.edit(said, '<@U0LEADSMAN> feed KELP');
    const { event } = JSON.parse((await app.requests.next()).body);
    expect(event).toMatchObject({ type: 'app_mention', ts: said.ts, edited: { user: 'U0ADA' } });
  });

  it('of a slash command names no thread', async () => {
    const { platform, app } = await setUp();
    platform.command({ channel, text: 'feed' });
    const fields = new URLSearchParams((await app.requests.next()).body);
    expect([...fields.keys()].filter((name) => name.includes('thread'))).toEqual([]);
    expect(fields.get('channel_id')).toBe(channel);
  });

  it('of a command is told once, acknowledged or not', async () => {
    const { platform, app } = await setUp();
    app.answerWith(500);
    const sent = platform.command({ channel, text: 'feed' });
    await app.requests.next();
    await platform.time.timerGone(3_000);
    platform.time.advance(600_000);
    expect(sent.attempts()).toBe(1);
  });
});

describe('what lives for a while', () => {
  const fieldsOf = async ({ platform, app }: Awaited<ReturnType<typeof setUp>>) => {
    platform.command({ channel, text: 'feed' });
    return new URLSearchParams((await app.requests.next()).body);
  };
  const respond = (url: string | null) =>
    fetch(url ?? '', { method: 'POST', body: JSON.stringify({ text: 'x' }) }).then(({ status }) => status);
  const modal = { type: 'modal', title: { type: 'plain_text', text: 'x' }, blocks: [{ type: 'divider' }] };

  it('a response address takes five replies', async () => {
    const stage = await setUp();
    const url = (await fieldsOf(stage)).get('response_url');
    const statuses: number[] = [];
    for (let count = 0; count < 6; count += 1) statuses.push(await respond(url));
    expect(statuses).toEqual([200, 200, 200, 200, 200, 404]);
  });

  it('a response address is good for half an hour', async () => {
    const stage = await setUp();
    const url = (await fieldsOf(stage)).get('response_url');
    stage.platform.time.advance(1_800_000);
    expect(await respond(url)).toBe(200);
    stage.platform.time.advance(1);
    expect(await respond(url)).toBe(404);
  });

  it('a trigger opens one form within three seconds', async () => {
    const stage = await setUp();
    const open = async (trigger_id: string | null) =>
      stage.refusalOf('views.open', { trigger_id, view: modal });
    const trigger = (await fieldsOf(stage)).get('trigger_id');
    stage.platform.time.advance(3_000);
    expect([await open(trigger), await open(trigger)]).toEqual(['ok', 'exchanged_trigger_id']);
    const late = (await fieldsOf(stage)).get('trigger_id');
    stage.platform.time.advance(3_001);
    expect(await open(late)).toBe('expired_trigger_id');
  });
});

describe('pins and pictures', () => {
  it('a message is pinned once', async () => {
    const { client, refusalOf } = await setUp();
    const { ts = '' } = await client.chat.postMessage({ channel, text: 'one' });
    const pin = { channel, timestamp: ts };
    expect(await refusalOf('pins.add', pin)).toBe('ok');
    expect(await refusalOf('pins.add', pin)).toBe('already_pinned');
    expect(await refusalOf('pins.remove', pin)).toBe('ok');
    expect(await refusalOf('pins.remove', pin)).toBe('no_pin');
  });

  it('an uploaded picture is shown once the platform has looked at it', async () => {
    const { platform, client, refusalOf } = await setUp();
    await client.filesUploadV2({ file: Buffer.from('a picture'), filename: 'x.png', alt_text: 'a picture' });
    const file = [...platform.files.values()][0];
    expect(file).toMatchObject({ completed: true, altText: 'a picture' });
    const blocks = [{ type: 'image', alt_text: 'a picture', slack_file: { id: file?.id } }];
    if (file !== undefined) file.refusalsLeft = 1;
    const post = { channel, text: 'x', blocks };
    expect(await refusalOf('chat.postMessage', post)).toBe('invalid_blocks');
    expect(await refusalOf('chat.postMessage', post)).toBe('ok');
  });
});

describe('forms', () => {
  const form = (text: string) => ({
    type: 'modal' as const,
    callback_id: 'form',
    title: { type: 'plain_text' as const, text: 'Form' },
    blocks: [
      {
        type: 'input',
        block_id: 'ticker',
        label: { type: 'plain_text', text },
        element: { type: 'external_select', action_id: 'ticker', min_query_length: 1 },
      },
    ],
  });

  it('take an update under their newest hash only', async () => {
    const { platform, client, refusalOf } = await setUp();
    platform.shortcut('form');
    const [trigger_id = ''] = platform.triggers.keys();
    const opened = await client.views.open({ trigger_id, view: form('one') });
    const { id: view_id = '', hash = '' } = opened.view ?? {};
    expect(await refusalOf('views.update', { view_id, hash, view: form('two') })).toBe('ok');
    expect(await refusalOf('views.update', { view_id, hash, view: form('three') })).toBe('hash_conflict');
  });

  it('are told what is typed from the least number of letters on', async () => {
    const { platform, client } = await setUp();
    platform.shortcut('form');
    const [trigger_id = ''] = platform.triggers.keys();
    await client.views.open({ trigger_id, view: form('one') });
    expect(() => platform.typeAhead('ticker', '')).toThrow('from 1 characters on');
  });

  it('come with an address to answer at only where the place was chosen', async () => {
    const { platform, app, client } = await setUp();
    platform.shortcut('form');
    const [trigger_id = ''] = platform.triggers.keys();
    await client.views.open({ trigger_id, view: form('one') });
    await app.requests.next();
    platform.submit({ ticker: 'KELP' });
    const payload = new URLSearchParams((await app.requests.next()).body).get('payload') ?? '';
    expect(JSON.parse(payload)).toMatchObject({ type: 'view_submission', response_urls: [] });
  });
});
