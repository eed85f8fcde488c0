import { describe, expect, it } from 'vitest';
import { settled, startBot } from './bot.ts';

const mention = {
  kind: 'events_api',
  payload: {
    type: 'event_callback',
    team_id: 'T0DESK',
    event: {
      type: 'app_mention',
      channel: 'C0DESK',
      user: 'U0ADA',
      text: '<@U0LEADSMAN> feed',
      ts: '1.000001',
    },
  },
} as const;

describe('over HTTP', () => {
  it('a mention is acknowledged and answered', async () => {
    const stage = await startBot({ mode: 'http' });
    const question = stage.platform.mention({ channel: 'C0DESK', text: 'interval KELP 60d' });
    expect((await stage.platform.posts.next()).threadTs).toBe(question.ts);
    await settled(stage, question);
    expect(question.sent.map((sent) => sent.attempts())).toEqual([1]);
  });

  it('a slash command and a press are answered', async () => {
    const { platform } = await startBot({ mode: 'http' });
    platform.command({ channel: 'C0DESK', text: 'shape KELP' });
    expect((await platform.responses.next()).text).toBe('Heard: shape KELP');
    platform.mention({ channel: 'C0DESK', text: 'interval KELP' });
    platform.press(await platform.posts.next(), 'working');
    expect((await platform.posts.next()).text).toBe('Working of: interval KELP');
  });

  it.each([
    ['signed with another secret', { secret: 'somebody else' }],
    ['signed more than five minutes ago', { ageSeconds: 301 }],
  ])('a request %s is turned away', async (_, signing) => {
    const stage = await startBot({ mode: 'http' });
    const answer = await stage.platform.forge(stage.url, mention, signing);
    expect(answer.status).toBe(401);
    await stage.bot.idle();
    expect(stage.asked).toEqual([]);
  });

  it('the same request, signed well and in time, is taken', async () => {
    const stage = await startBot({ mode: 'http' });
    const answer = await stage.platform.forge(stage.url, mention, { ageSeconds: 295 });
    expect(answer.status).toBe(200);
    await stage.bot.idle();
    expect(stage.asked).toHaveLength(1);
  });

  it('other paths are not found', async () => {
    const stage = await startBot({ mode: 'http' });
    const other = stage.url.replace('/slack/events', '/anything');
    expect((await stage.platform.forge(other, mention, {})).status).toBe(404);
  });
});
