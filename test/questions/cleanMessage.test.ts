import { expect, test } from 'vitest';
import { cleanMessage } from '../../src/questions/cleanMessage.ts';
import { canonicalsOf, context, problemIn } from './asking.ts';

/** The words of the cleaned text; blanks between them do not matter. */
const words = (text: string, ownId?: string): string =>
  cleanMessage(text, ownId).text.replace(/ +/g, ' ').trim();

const mention = '\uFFFC';

test.each([
  ['a mention at the head', '<@U1> interval KELP', 'interval KELP'],
  ['a mention with a name at the head', ' <@U1|leadsman>: interval KELP', ': interval KELP'],
  ['a name at the head', '@leadsman interval KELP', 'interval KELP'],
  ['a second mention', '<@U1> <@U2> interval', `${mention} interval`],
  ['a mention inside', 'interval <@U2> KELP', `interval ${mention} KELP`],
  ['a channel', 'interval <#C1|general>', `interval ${mention}`],
  ['a channel at the head', '<#C1> interval', `${mention} interval`],
  ['everyone', 'interval <!here> <!channel|@channel>', `interval ${mention} ${mention}`],
  ['a group', 'interval <!subteam^S1|@desk>', `interval ${mention}`],
  ['a link with a text', 'interval <http://KELP.ONE|KELP.ONE> 60d', 'interval KELP.ONE 60d'],
  ['a link without a text', 'interval <https://kelp.one/chart?x=1#y> 60d', 'interval kelp.one 60d'],
  ['a link with a port', '<http://kelp.one:8080>', 'kelp.one'],
  ['a mail address', 'records <mailto:a@b.com|a@b.com>', 'records a@b.com'],
  ['a mail address without a text', '<mailto:a@b.com?subject=x>', 'a@b.com'],
  ['a telephone number', 'on <tel:2000000|2000000> USD', 'on 2000000 USD'],
  ['a telephone number without a text', 'on <tel:2000000>', 'on 2000000'],
  ['entities', 'KELP &amp; TARN &lt; 5 &gt; 3', 'KELP & TARN < 5 > 3'],
  ['entities, once', '&amp;lt;@U1&amp;gt;', '&lt;@U1&gt;'],
  ['entities in the text of a link', '<http://a|A&amp;B>', 'A&B'],
  ['typed angle brackets', 'interval &lt;@U1&gt;', 'interval <@U1>'],
  ['brackets that are only brackets', 'a < b and c > d, <b>', 'a < b and c > d, <b>'],
  ['an open bracket', 'interval <http://kelp', 'interval <http://kelp'],
  ['typographic quotes', '“what’s” ‘the’ «vol» „of‟', '"what\'s" \'the\' "vol" "of"'],
  ['dashes', '2026–01–02/2026—03‑31 −5bp', '2026-01-02/2026-03-31 -5bp'],
  ['odd blanks', 'interval\u00a0KELP\u202f60d\u3000at\u2009\t95%', 'interval KELP 60d at 95%'],
  ['invisible characters', 'inter\u200bval \u2066KELP\u2069\ufeff 6\u00ad0d\ufe0f', 'interval KELP 60d'],
  ['control characters', 'interval\u0000KELP\u001b60d', 'interval KELP 60d'],
  ['line ends', 'a\r\nb\rc\u2028d', 'a\nb\nc\nd'],
  ['bold', '*interval* KELP', 'interval KELP'],
  ['bold over several words', '*interval KELP* 60d', 'interval KELP 60d'],
  ['marks in marks', '*_interval_ ~KELP~* 60d.', 'interval KELP 60d.'],
  ['double marks', '**KELP**', 'KELP'],
  ['a mark within a word', 'KELP_A 2*3 ~5', 'KELP_A 2*3 ~5'],
  ['marks that do not close on their line', '*interval\nKELP*', '*interval\nKELP*'],
  ['a block of code', '```interval KELP```', 'interval KELP'],
  ['a ticker in back-ticks', 'interval `ALL` *60d*', 'interval `ALL` 60d'],
  ['marks within back-ticks', '`_A_` *b*', '`_A_` b'],
  ['an open back-tick', 'interval `KELP\n*b*', 'interval `KELP\nb'],
])('%s: %j', (_, text, cleaned) => {
  expect(words(text)).toBe(cleaned);
});

test('the bot’s own mention goes wherever it stands, others only at the head', () => {
  expect(words('interval KELP <@UBOT> <@U2>', 'UBOT')).toBe(`interval KELP ${mention}`);
  expect(words('interval KELP <@UBOT|leadsman>', 'UBOT')).toBe('interval KELP');
  expect(canonicalsOf('interval KELP <@UBOT>', { ...context, ownId: 'UBOT' })).toEqual([
    'interval KELP 60d at 95%',
  ]);
});

test.each([
  'interval KELP 60d',
  '<@U1> *interval* KELP',
  'a &amp; b <http://KELP.ONE|KELP.ONE> 60d',
  '“KELP” – `ALL`\r\n~x~\u200by',
])('every kept character of %j is found again in the original', (text) => {
  const clean = cleanMessage(text);
  for (const [index, character] of Array.from(clean.text).entries()) {
    if (!/[a-z0-9]/i.test(character)) continue;
    const { start, end } = clean.originalPosition({ start: index, end: index + 1 });
    expect(text.slice(start, end)).toBe(character);
  }
  expect(clean.originalPosition({ start: 0, end: clean.text.length }).end).toBeLessThanOrEqual(text.length);
});

test('an empty range and one at the end stay inside the original', () => {
  const clean = cleanMessage('*a*');
  expect(clean.originalPosition({ start: 0, end: 0 })).toEqual({ start: 1, end: 1 });
  expect(clean.originalPosition({ start: 1, end: 1 })).toEqual({ start: 3, end: 3 });
});

test('positions of problems refer to the cleaned text', () => {
  const text = '<@U1> *interval* <http://KELP.ONE|KELP.ONE> foo';
  const { position } = problemIn(text);
  const clean = cleanMessage(text);
  expect(clean.text.slice(position?.start, position?.end)).toBe('foo');
  expect(clean.originalPosition(position ?? { start: 0, end: 0 })).toEqual({ start: 44, end: 47 });
});

test.each([
  [
    '<@U1> *interval* <http://KELP.ONE|KELP.ONE> 60d at&nbsp;95%'.replace('&nbsp;', '\u00a0'),
    'interval KELP.ONE 60d at 95%',
  ],
  ['<@U1>: _what’s_ the vol of <http://kelp.one|kelp.one>’s last 3m', 'interval vol KELP.ONE 3m at 95%'],
  ['```\ninterval KELP\n```', 'interval KELP 60d at 95%'],
  ['compare KELP &amp; TARN', 'compare KELP TARN 60d at 95%'],
])('%j is read as it was typed', (text, canonical) => {
  expect(canonicalsOf(text)).toEqual([canonical]);
});
