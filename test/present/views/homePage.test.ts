import { describe, expect, test } from 'vitest';
import type { SubscriptionInWords } from '../../../src/present/compose/scheduled/subscriptions.ts';
import { viewFaults } from '../../../src/present/limits/viewFaults.ts';
import { toText } from '../../../src/present/text.ts';
import { type HomePage, homeReply, homeView } from '../../../src/present/views/homePage.ts';

const digest = (number: number, more: Partial<SubscriptionInWords> = {}): SubscriptionInWords => ({
  id: `D-${number}`,
  kind: 'digest',
  state: 'active',
  pausedWhy: null,
  asks: 'digest sessions 08:30 Europe/London KELP TARN 500d at 99% by student',
  nextDueMs: Date.parse('2026-11-30T08:30:00Z'),
  timeZone: 'Europe/London',
  ...more,
});

const page = (more: Partial<HomePage> = {}): HomePage => ({
  barred: null,
  feed: 'The feed holds 8,651 prices of 12 tickers.',
  stale: null,
  subscriptions: [digest(1), digest(2, { state: 'paused', pausedWhy: 'place' })],
  subscriptionCount: 2,
  page: 0,
  recent: [
    {
      id: 'R-7Q2M9K4TXD',
      question: 'interval KELP 60d at 95%',
      askedAtMs: Date.parse('2026-11-27T15:00:00Z'),
    },
  ],
  troubles: [],
  examples: ['interval KELP 60d'],
  timeZone: 'Europe/London',
  note: null,
  ...more,
});

const many = (more: Partial<HomePage> = {}) =>
  page({
    subscriptions: Array.from({ length: 20 }, (_, at) => digest(at + 1)),
    subscriptionCount: 47,
    ...more,
  });

const typesIn = (shown: HomePage) => homeView(shown).blocks.map((block) => (block as { type: string }).type);

describe('the home page as a view', () => {
  test('keeps the limits with twenty long digests, a note and everything missing', () => {
    const full = many({
      note: 'x'.repeat(4000),
      page: 1,
      subscriptions: Array.from({ length: 20 }, (_, at) => digest(at, { asks: 'y'.repeat(4000) })),
      recent: Array.from({ length: 10 }, () => ({ id: 'R-1', question: 'z'.repeat(2000), askedAtMs: 0 })),
      troubles: ['a', 'b'],
    });
    expect(viewFaults(homeView(full))).toEqual([]);
    expect(viewFaults(homeView(page()))).toEqual([]);
  });

  test('has one section with a menu for each digest and watch', () => {
    const rows = homeView(page()).blocks.filter((block) => 'accessory' in block);
    expect(rows).toHaveLength(2);
    expect(JSON.stringify(rows[0])).toContain('D-1, active: digest sessions');
    expect(JSON.stringify(rows[0])).toMatch(/pauseSubscription.*stopSubscription/);
    expect(JSON.stringify(rows[1])).toContain('paused, since its place cannot be posted to');
    expect(JSON.stringify(rows[1])).toMatch(/resumeSubscription.*stopSubscription/);
  });

  test.each([
    [0, ['page.1']],
    [1, ['page.0', 'page.2']],
    [2, ['page.1']],
  ])('page %i of three turns to %j', (at, turns) => {
    const buttons = [
      ...JSON.stringify(homeView(many({ page: at })).blocks).matchAll(/"action_id":"(page\.\d)"/g),
    ];
    expect(buttons.map(([, id]) => id)).toEqual(turns);
  });

  test('says old prices, a note and what is missing in words', () => {
    const shown = JSON.stringify(
      homeView(page({ stale: 'prices are old', note: 'D-1 is paused.', troubles: ['No store.'] })),
    );
    for (const words of ['Caution: prices are old', 'D-1 is paused.', 'No store.'])
      expect(shown).toContain(words);
  });

  test('is one page without buttons to turn where there are few', () => {
    expect(typesIn(page())).not.toContain('actions');
    expect(JSON.stringify(homeView(page({ subscriptions: [], subscriptionCount: 0, recent: [] })))).toContain(
      'None.',
    );
  });
});

describe('the home page as text', () => {
  test('holds the same, its menus as buttons', () => {
    const reply = homeReply(page());
    expect(reply.buttons.map(({ label }) => label)).toEqual([
      'Pause: D-1',
      'Stop for good: D-1',
      'Resume: D-2',
      'Stop for good: D-2',
    ]);
    const text = toText(reply, { width: 100 });
    for (const words of [
      'The feed holds',
      'D-1, active',
      'R-7Q2M9K4TXD',
      'interval KELP 60d',
      '[1] Pause: D-1',
    ])
      expect(text).toContain(words);
  });

  test('says how the next page is shown', () => {
    expect(toText(homeReply(many()), { width: 200 })).toContain('page 1 of 3; home 2 shows the next');
  });
});
