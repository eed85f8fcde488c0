import { describe, expect, test } from 'vitest';
import { canonicalsOf, problemIn, questionIn } from '../asking.ts';

const figure = '500d at 99% by student';

describe('a digest that is made', () => {
  test.each([
    ['digest KELP', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest sessions 08:30 KELP TARN at 99%', `digest sessions 08:30 Europe/London KELP TARN ${figure}`],
    ['KELP digest at 8:30', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 8.30', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 8:30am', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 8:30 PM', `digest sessions 20:30 Europe/London KELP ${figure}`],
    ['digest KELP 12am', `digest sessions 00:00 Europe/London KELP ${figure}`],
    ['digest KELP at 12pm', `digest sessions 12:00 Europe/London KELP ${figure}`],
    ['digest KELP 0:55', `digest sessions 00:55 Europe/London KELP ${figure}`],
    ['digest weekdays KELP', `digest weekdays 08:30 Europe/London KELP ${figure}`],
    ['digest daily KELP', `digest daily 08:30 Europe/London KELP ${figure}`],
    ['digest mon,thu KELP', `digest mon,thu 08:30 Europe/London KELP ${figure}`],
    ['digest Thursday and monday KELP', `digest mon,thu 08:30 Europe/London KELP ${figure}`],
    ['digest month start KELP', `digest month start 08:30 Europe/London KELP ${figure}`],
    ['digest month end 17:00 KELP', `digest month end 17:00 Europe/London KELP ${figure}`],
    ['digest KELP 08:30 Europe/Berlin', `digest sessions 08:30 Europe/Berlin KELP ${figure}`],
    ['digest KELP 08:30 europe/berlin', `digest sessions 08:30 Europe/Berlin KELP ${figure}`],
    [
      'digest KELP 08:30 America/Argentina/Ushuaia',
      `digest sessions 08:30 America/Argentina/Ushuaia KELP ${figure}`,
    ],
    ['digest KELP 08:30 America/New_York', `digest sessions 08:30 America/New_York KELP ${figure}`],
    ['digest KELP 08:30 UTC', `digest sessions 08:30 UTC KELP ${figure}`],
    ['digest KELP 08:30 london', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 08:30 New York', `digest sessions 08:30 America/New_York KELP ${figure}`],
    ['digest KELP at 97.5% by peaks 250d', 'digest sessions 08:30 Europe/London KELP 250d at 97.5% by peaks'],
    ['digest KELP at 0.99', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP at 99.9', 'digest sessions 08:30 Europe/London KELP 500d at 99.9% by student'],
    ['digest `ALL` EUR/USD', `digest sessions 08:30 Europe/London \`ALL\` EUR/USD ${figure}`],
  ])('%s', (text, canonical) => {
    expect(canonicalsOf(text)).toEqual([canonical]);
  });

  test('says what it took for granted', () => {
    expect(questionIn('digest KELP').assumed).toEqual([
      'sessions (default)',
      '08:30 (default)',
      'Europe/London (default)',
      '99% (default)',
      'by student (default)',
    ]);
    expect(questionIn('digest KELP New York mon 9:00 at 99% by peaks').assumed).toEqual([
      'New York read as America/New_York',
    ]);
  });

  test('takes many tickers, each once', () => {
    expect(questionIn('digest KELP TARN WREN KELP.ONE EUR/USD `ALL` `700`').question).toMatchObject({
      tickers: ['KELP', 'TARN', 'WREN', 'KELP.ONE', 'EUR/USD', 'ALL', '700'],
    });
    expect(problemIn('digest KELP KELP')).toMatchObject({ code: 'repeated' });
  });
});

describe('a digest that exists', () => {
  test.each([
    ['digest list', { do: 'list' }],
    ['list digest', { do: 'list' }],
    ['digest now d-12', { do: 'now', id: 'D-12' }],
    ['digest pause D-12', { do: 'pause', id: 'D-12' }],
    ['digest D-12 resume please', { do: 'resume', id: 'D-12' }],
    ['digest stop D-12', { do: 'stop', id: 'D-12' }],
  ])('%s', (text, question) => {
    expect(questionIn(text).question).toEqual({ verb: 'digest', ...question });
  });

  const unchanged = {
    tickers: [],
    days: null,
    minutes: null,
    timeZone: null,
    window: null,
    tailLevel: null,
    model: null,
  };

  test.each([
    ['digest change D-12 09:00', { minutes: 540 }],
    ['digest change D-12 daily', { days: { kind: 'daily' } }],
    ['digest change D-12 Asia/Tokyo', { timeZone: 'Asia/Tokyo' }],
    ['digest change D-12 KELP TARN', { tickers: ['KELP', 'TARN'] }],
    [
      'digest change D-12 at 97.5% by peaks 250d',
      {
        tailLevel: { digits: 975, places: 3 },
        model: 'peaks',
        window: { kind: 'returns', count: 250 },
      },
    ],
  ])('%s', (text, change) => {
    expect(questionIn(text).question).toEqual({
      verb: 'digest',
      do: 'change',
      id: 'D-12',
      change: { ...unchanged, ...change },
    });
  });
});

test('a digest is shown now as a picture too', () => {
  const read = questionIn('digest now D-12 as picture');
  expect(read.question).toEqual({ verb: 'digest', do: 'now', id: 'D-12' });
  expect(read.wishes).toEqual(['picture']);
});

describe('a digest that cannot be read', () => {
  test.each([
    ['digest', 'noTicker', 'digest list'],
    ['digest sessions 08:30', 'noTicker', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 25:00', 'badTime', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP at 8:75', 'badTime', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 13am', 'badTime', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 9', 'ambiguous', `digest sessions 09:00 Europe/London KELP ${figure}`],
    ['digest KELP Europe/Lundon', 'badTime', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP 08:30 09:00', 'repeated', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest KELP daily weekdays', 'repeated', `digest daily 08:30 Europe/London KELP ${figure}`],
    ['digest KELP at 5%', 'levelOutside', `digest sessions 08:30 Europe/London KELP 500d at 95% by student`],
    ['digest KELQ', 'unknownTicker', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest dayly KELP', 'unreadableWords', `digest daily 08:30 Europe/London KELP ${figure}`],
    ['digest KELP beyond 4%', 'notForVerb', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest D-12', 'missingPart', 'digest now D-12'],
    ['digest pause', 'missingPart', 'digest list'],
    ['digest pause W-7', 'notForVerb', 'watch pause W-7'],
    ['digest pause D-12 KELP', 'notForVerb', 'digest pause D-12'],
    ['digest list KELP', 'notForVerb', 'digest list'],
    ['digest change D-12', 'missingPart', 'digest change D-12 09:00'],
    ['digest change 09:00', 'missingPart', 'digest list'],
    ['digest pause D-12 D-13', 'repeated', 'digest pause D-12'],
    ['digest pause stop D-12', 'repeated', 'digest pause D-12'],
    ['digest pause D-12 as picture', 'notForVerb', 'digest pause D-12'],
    ['digest KELP as picture', 'notForVerb', `digest sessions 08:30 Europe/London KELP ${figure}`],
    ['digest now D-12 as json', 'notForVerb', 'digest now D-12'],
  ])('%s: %s', (text, code, suggestion) => {
    expect(problemIn(text)).toMatchObject({ code, suggestion });
  });

  test('the fault stands where it is', () => {
    const problem = problemIn('digest KELP at 25:00 please');
    expect(problem.position).toEqual({ start: 12, end: 20 });
    expect(problem.message).toBe(
      '“at 25:00” (words 3 to 4) is not a time of day. Write 08:30, 8.30 or 8:30am.',
    );
  });
});

const tail = '500d at 99% confidence 95% over 1d by student';
const ofLoss = '500d at 99% confidence 95% by student';

describe('a watch', () => {
  test.each([
    ['watch KELP tail 99% above 4%', `watch tail KELP ${tail} above 4%`],
    ['watch KELP VaR above 400bp', `watch tail KELP ${tail} above 4%`],
    [
      'watch KELP ES 97.5% below 90bp',
      'watch es KELP 500d at 97.5% confidence 95% over 1d by student below 90bp',
    ],
    [
      'watch KELP tail over 10d by peaks 1y above 9%',
      'watch tail KELP 1y at 99% confidence 95% over 10d by peaks above 9%',
    ],
    ['watch KELP loss beyond tail', `watch loss beyond tail KELP ${ofLoss}`],
    [
      'watch losses beyond VaR KELP 97.5%',
      'watch loss beyond tail KELP 500d at 97.5% confidence 95% by student',
    ],
    ['watch `ES` tail above 4%', `watch tail \`ES\` ${tail} above 4%`],
    ['watch list', 'watch list'],
    ['watch stop w-7', 'watch stop W-7'],
    ['watch pause W-7', 'watch pause W-7'],
    ['watch resume W-7', 'watch resume W-7'],
  ])('%s', (text, canonical) => {
    expect(canonicalsOf(text)).toEqual([canonical]);
  });

  test('several tickers are several watches', () => {
    expect(canonicalsOf('watch KELP TARN loss beyond tail')).toEqual([
      `watch loss beyond tail KELP ${ofLoss}`,
      `watch loss beyond tail TARN ${ofLoss}`,
    ]);
  });

  test.each([
    ['watch KELP', 'missingPart', null],
    ['watch KELP above 4%', 'missingPart', `watch tail KELP ${tail} above 4%`],
    ['watch KELP tail', 'missingPart', `watch tail KELP ${tail} above 4%`],
    ['watch KELP tail above', 'missingPart', `watch tail KELP ${tail} above 4%`],
    ['watch KELP tail above -4%', 'sizeOutside', `watch tail KELP ${tail} above 4%`],
    ['watch KELP loss', 'missingPart', `watch loss beyond tail KELP ${ofLoss}`],
    ['watch KELP loss beyond 4%', 'missingPart', null],
    ['watch KELP loss beyond tail above 4%', 'notForVerb', `watch loss beyond tail KELP ${ofLoss}`],
    ['watch KELP loss beyond tail over 10d', 'notForVerb', `watch loss beyond tail KELP ${ofLoss}`],
    ['watch tail above 4%', 'noTicker', `watch tail KELP ${tail} above 4%`],
    ['watch KELP interval above 4%', 'notForVerb', `watch tail KELP ${tail} above 4%`],
    ['watch D-12 stop', 'notForVerb', 'digest stop D-12'],
    ['watch W-7', 'missingPart', 'watch pause W-7'],
    ['watch stop', 'missingPart', 'watch list'],
    ['watch change W-7 above 5%', 'notForVerb', 'watch list'],
    ['watch KELP tail above 4% above 5%', 'repeated', `watch tail KELP ${tail} above 4%`],
  ])('%s: %s', (text, code, suggestion) => {
    const problem = problemIn(text);
    expect(problem.code).toBe(code);
    if (suggestion !== null) expect(problem.suggestion).toBe(suggestion);
    else expect(problem.suggestion).not.toBe(null);
  });
});
