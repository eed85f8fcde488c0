import { describe, expect, test } from 'vitest';
import { toBlocks } from '../../../src/present/blocks.ts';
import { scheduledReply } from '../../../src/present/compose/scheduled/scheduledReply.ts';
import { limitFaults } from '../../../src/present/limits/limitFaults.ts';
import { toText } from '../../../src/present/text.ts';
import { inWords } from '../../../src/present/words.ts';
import type {
  DigestFigures,
  DigestPost,
  OwnerNote,
  WatchPost,
  WatchReading,
} from '../../../src/terms/scheduledPosts.ts';
import { at, day } from '../../digests/days.ts';

const kelp: DigestFigures = {
  ok: true,
  ticker: 'KELP',
  asOf: day('2026-11-26'),
  lastReturn: -0.0312,
  exceeded: true,
  var: 0.0272,
  varLower: 0.024,
  varUpper: 0.0319,
  es: 0.0358,
  esLower: 0.0301,
  esUpper: 0.0459,
  change: 0.0012,
  changeOverHalfWidth: 0.304,
  judged: { days: 250, exceedances: 5, zone: 'yellow' },
  notJudged: null,
  tailId: 'R-7Q2M9K4TXD',
  backtestId: 'R-3FHW8N0ZQC',
  warnings: ['first', 'second', 'third'],
};

const digest: DigestPost = {
  kind: 'digest',
  dueMs: at('2026-11-27T08:30Z'),
  id: 'D-1',
  timeZone: 'Europe/London',
  tailLevel: 0.99,
  confidenceLevel: 0.95,
  model: 'student',
  window: '500d',
  oldPrices: null,
  skipped: null,
  flags: [],
  lines: [kelp],
  byChance: { exceedances: 0.01, nonGreenZones: 0.1078 },
};

describe('the post of a digest', () => {
  test('begins with old prices, then what was left out and flags, then what stands out beside chance', () => {
    const reply = scheduledReply({
      ...digest,
      oldPrices: {
        lastDay: day('2026-11-26'),
        expectedDay: day('2026-11-27'),
        sessionsBehind: 1,
        tickers: ['KELP'],
      },
      skipped: { count: 1, firstMs: at('2026-11-26T08:30Z'), lastMs: at('2026-11-26T08:30Z') },
      flags: ['KELP: one close is far from its neighbours'],
    });
    expect(reply.sentence).toBe(
      'Prices end Thursday 26 Nov 2026, one session old. ' +
        'The digest of 2026-11-26 08:30 Europe/London could not be posted in time. ' +
        'The feed flags 1 thing in these prices, said below. ' +
        '1 loss exceeded its figure and 1 zone is not green; chance alone would bring 0.010 and 0.11 among 1 ticker.',
    );
    expect(reply.passages[0]).toEqual({
      head: 'Flags',
      lines: ['KELP: one close is far from its neighbours'],
    });
  });

  test('has a line per ticker, digits by its interval, bounds outward', () => {
    const { table, caution } = scheduledReply(digest);
    expect(table?.columns.map(({ head }) => head)).toEqual([
      '% a day',
      'last',
      'VaR',
      'at 95%',
      'ES',
      'at 95%',
      'moved',
      'exceeded',
    ]);
    expect(table?.rows).toEqual([
      [
        'KELP',
        '−3.12 exceeded',
        '2.72',
        '2.40 to 3.19',
        '3.58',
        '3.01 to 4.59',
        '+0.12 (0.3)',
        '5 in 250, yellow',
      ],
    ]);
    expect(caution).toContain('licensed advisers');
  });

  test('names old tickers where only some are old, and counts several digests that were left out', () => {
    const { sentence } = scheduledReply({
      ...digest,
      lines: [kelp, { ok: false, ticker: 'TARN', message: 'TARN is held back.' }],
      oldPrices: {
        lastDay: day('2026-11-25'),
        expectedDay: day('2026-11-27'),
        sessionsBehind: 2,
        tickers: ['KELP'],
      },
      skipped: { count: 3, firstMs: at('2026-11-24T08:30Z'), lastMs: at('2026-11-26T08:30Z') },
    });
    expect(sentence).toContain('The prices of KELP end Wednesday 25 Nov 2026, 2 sessions old.');
    expect(sentence).toContain(
      '3 digests from 2026-11-24 08:30 Europe/London to 2026-11-26 08:30 Europe/London could not be posted in time.',
    );
  });

  test('says what is not given, and what there is nothing to say of', () => {
    const bare = { ...kelp, change: null, changeOverHalfWidth: null, es: null, judged: null, exceeded: null };
    const reply = scheduledReply({
      ...digest,
      lines: [bare, { ok: false, ticker: 'TARN', message: 'TARN is held back.' }],
      byChance: { exceedances: 0, nonGreenZones: null },
    });
    expect(reply.table?.rows[0]?.slice(4)).toEqual(['none', '–', '–', '–']);
    expect(reply.passages).toEqual([{ head: 'Not given', lines: ['TARN: TARN is held back.'] }]);
    expect(reply.sentence).toBe('0 losses exceeded their figure; chance alone would bring 0 among 1 ticker.');
  });

  test('of the most tickers keeps to the platform’s limits, and so does its thread', () => {
    const lines = Array.from({ length: 50 }, (_, each) => ({ ...kelp, ticker: `LONG.NAME${each}` }));
    for (const post of [
      digest,
      { ...digest, kind: 'detail' as const },
      { ...digest, kind: 'fresh' as const },
    ]) {
      const message = toBlocks(scheduledReply({ ...post, lines }));
      expect(limitFaults(message)).toEqual([]);
    }
    const [, table] = toBlocks(scheduledReply({ ...digest, lines })).blocks;
    expect(table?.type === 'table' ? table.rows.length : 0).toBe(51);
  });

  test('reads well in a terminal', () => {
    expect(toText(scheduledReply(digest), { width: 100 })).toContain('KELP     −3.12 exceeded  2.72');
  });

  test('holds the ids and two cautions of each ticker in its thread', () => {
    expect(scheduledReply({ ...digest, kind: 'detail' }).passages).toEqual([
      {
        head: 'KELP',
        lines: [
          'tail R-7Q2M9K4TXD, backtest R-3FHW8N0ZQC',
          'first',
          'second',
          'and 1 more caution: again R-7Q2M9K4TXD tells them',
        ],
      },
    ]);
  });

  test('is followed by one reply when the missing prices are in', () => {
    const { sentence } = scheduledReply({ ...digest, kind: 'fresh' });
    expect(sentence).toMatch(/^The missing closes are in, data to 2026-11-26\. 1 loss exceeded its figure/);
  });
});

const reading: WatchReading = {
  of: 'var',
  day: day('2026-11-26'),
  value: 0.0421,
  lower: 0.039,
  upper: 0.046,
  line: 0.04,
  side: 'above',
  lineDay: null,
  answerId: 'R-7Q2M9K4TXD',
};

const watch: WatchPost = {
  kind: 'watch',
  id: 'W-7',
  event: 'fired',
  ticker: 'KELP',
  question: 'watch tail KELP 500d at 99% confidence 95% over 1d by student above 4%',
  tailLevel: 0.99,
  confidenceLevel: 0.95,
  model: 'student',
  reading,
  reason: null,
  restated: false,
};

describe('what a watch says', () => {
  test.each<[string, Partial<WatchPost>, string]>([
    ['when a line is crossed', {}, 'KELP’s 99% VaR is above 4% now: 4.21% (at 95% 3.90 to 4.60).'],
    [
      'below a line',
      { reading: { ...reading, of: 'es', side: 'below', line: 0.05 } },
      'KELP’s 99% ES is below 5% now: 4.21% (at 95% 3.90 to 4.60).',
    ],
    [
      'when it is over',
      { event: 'cleared', reading: { ...reading, value: 0.0372, lower: 0.034, upper: 0.041 } },
      'KELP’s 99% VaR has been back under 4% for two sessions: 3.72% (at 95% 3.40 to 4.10).',
    ],
    [
      'of a loss',
      {
        reading: {
          ...reading,
          of: 'loss',
          value: 0.032,
          lower: null,
          upper: null,
          line: 0.0272,
          lineDay: day('2026-11-25'),
        },
      },
      'KELP lost 3.20% on 2026-11-26, more than its 99% VaR of 2.72%, made from prices to 2026-11-25.',
    ],
    [
      'when it cannot tell',
      { event: 'cannotTell', reading: null, reason: 'KELP is not in the feed.' },
      'W-7 cannot tell: KELP is not in the feed.',
    ],
  ])('%s', (_, more, sentence) => {
    expect(scheduledReply({ ...watch, ...more }).sentence).toBe(sentence);
  });

  test('names itself, its question, its data and the answer on record', () => {
    expect(scheduledReply(watch).quietLine).toBe(
      'W-7, watch tail KELP 500d at 99% confidence 95% over 1d by student above 4%, data to 2026-11-26, R-7Q2M9K4TXD',
    );
  });

  test('mentions a restated past', () => {
    expect(inWords(scheduledReply({ ...watch, restated: true }))).toContain('restated since');
    expect(inWords(scheduledReply(watch))).not.toContain('restated');
  });
});

test.each<[OwnerNote['what'], string, string]>([
  [
    'paused',
    'archived',
    'D-1 is paused: its channel is archived. It goes on by itself once it can be posted again; digest stop D-1 ends it.',
  ],
  [
    'stopped',
    'shared',
    'D-1 is stopped: its channel is shared with another company now. It does not go on by itself. Make it anew where it may be read.',
  ],
  [
    'paused',
    'msg_too_long',
    'D-1 is paused: the platform says msg_too_long. It goes on by itself once it can be posted again; digest stop D-1 ends it.',
  ],
])('its owner is told that it is %s (%s)', (what, why, sentence) => {
  expect(
    scheduledReply({ kind: 'note', id: 'D-1', subject: 'digest', what, why, channel: 'C1' }).sentence,
  ).toBe(sentence);
});
