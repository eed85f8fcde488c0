import { describe, expect, it } from 'vitest';
import { concernsBot, heardIn } from '../../../src/workspaces/slack/heard.ts';

const self = { userId: 'U0BOT', botId: 'B0BOT' };
const mention = { type: 'app_mention', channel: 'C1', ts: '10.000001', user: 'U1', text: '<@U0BOT> feed' };

describe('a question in an event', () => {
  it('has one key in both kinds of event, another after an edit and another elsewhere', () => {
    const keyOf = (event: object, team = 'T1') => heardIn({ ...mention, ...event }, team, self)?.eventKey;
    const key = keyOf({});
    expect(key).toBeDefined();
    expect(keyOf({ type: 'message' })).toBe(key);
    const others = [
      keyOf({ edited: { ts: '11.0' } }),
      keyOf({ edited: { ts: '12.0' } }),
      keyOf({ ts: '10.000002' }),
      keyOf({ channel: 'C2' }),
      keyOf({}, 'T2'),
    ];
    expect(new Set([key, ...others]).size).toBe(6);
  });

  it('keeps its message key through an edit', () => {
    const edited = heardIn({ ...mention, edited: { ts: '11.0' } }, 'T1', self);
    expect(edited?.messageKey).toBe(heardIn(mention, 'T1', self)?.messageKey);
  });

  it.each([
    ['a bot', { bot_id: 'B2' }],
    ['nobody', { user: undefined }],
    ['the bot itself', { user: 'U0BOT' }],
    ['the platform', { subtype: 'channel_join' }],
    ['someone changing a message', { type: 'message', subtype: 'message_changed' }],
    ['someone talking to another bot', { type: 'message', text: '<@U0BOTANIST> feed' }],
    ['another kind of event', { type: 'reaction_added' }],
  ])('is not heard from %s', (_, event) => {
    expect(heardIn({ ...mention, ...event }, 'T1', self)).toBeNull();
  });
});

describe('what concerns the bot', () => {
  it('is what is put to it, and whatever is not people talking', () => {
    const eventOf = (event: object) => ({ team_id: 'T1', event });
    expect(concernsBot(eventOf(mention), self)).toBe(true);
    expect(concernsBot(eventOf({ type: 'channel_archive', channel: 'C1' }), self)).toBe(true);
    expect(concernsBot({ type: 'block_actions' }, self)).toBe(true);
    expect(concernsBot(eventOf({ ...mention, type: 'message', text: 'between us' }), self)).toBe(false);
  });
});
