import { describe, expect, test } from 'vitest';
import { drawnIntervals } from '../../../../../src/stats/tails/horizon/internal/drawnIntervals.ts';
import { level, level95 } from '../../../levels.ts';

const firstStream = 2 ** 20;

/** Draw t has figures t and 2t; the draws for which `fails` holds cannot be fitted. */
const intervalsOf = (
  fails: (draw: number) => boolean,
  { horizonDays = 10, confidence = level95 } = {},
): ReturnType<typeof drawnIntervals> =>
  drawnIntervals({
    redraw: (random) => {
      const draw = random.nextUint32() - firstStream;
      return fails(draw)
        ? null
        : (_, into) => {
            into[0] = draw;
          };
    },
    figuresOf: (paths) => {
      const into = new Float64Array(1);
      paths({ nextUint32: () => 0 }, into);
      const [draw = Number.NaN] = into;
      return { var: draw, es: 2 * draw };
    },
    shift: { var: 0.5, es: 0.25 },
    horizonDays,
    confidence,
    streams: { stream: (replicate) => ({ nextUint32: () => replicate }) },
  });
const none = () => false;

describe('ends over 200 draws, by hand', () => {
  // (200 + 1)·2.5% = 5.025: the 5th from below and the 196th, draws 4 and 195 counted from 0, each moved by the shift.
  const ends = {
    var: { lower: 4.5, upper: 195.5 },
    es: { lower: 8.25, upper: 390.25 },
    notes: [],
  };

  test('come from the streams 2^20 and up', () => {
    expect(intervalsOf(none)).toEqual(ends);
  });

  test('are drawn up to 60 days and no further', () => {
    expect(intervalsOf(none, { horizonDays: 60 })).toEqual(ends);
    expect(intervalsOf(none, { horizonDays: 61 })).toEqual({
      var: null,
      es: null,
      notes: [
        {
          figure: 'varInterval',
          code: 'horizonTooLong',
          text: 'An interval is drawn for horizons of up to 60 days, and 61 were asked.',
          needs: null,
        },
      ],
    });
  });

  test('draws that fail are replaced, as many as were wanted', () => {
    // Every other draw fails: 200 are left of 400, draws 1, 3 … 399; the 5th is 9, the 196th 391.
    expect(intervalsOf((draw) => draw % 2 === 0)).toEqual({
      var: { lower: 9.5, upper: 391.5 },
      es: { lower: 18.25, upper: 782.25 },
      notes: [],
    });
  });

  test.each([
    [201, '201 of 400 draws of the parameters could not be fitted.'],
    [400, '400 of 400 draws of the parameters could not be fitted.'],
  ])('%s failures leave none', (failures, text) => {
    expect(intervalsOf((draw) => draw < failures)).toEqual({
      var: null,
      es: null,
      notes: [{ figure: 'varInterval', code: 'resamplesLeftOut', text, needs: null }],
    });
  });

  test('99% is the last level that 200 draws reach', () => {
    // (200 + 1)·0.5% = 1.005; at 99.1% it is 0.9045.
    expect(intervalsOf(none, { confidence: level('0.99') }).var).toEqual({ lower: 0.5, upper: 199.5 });
    const beyond = intervalsOf(none, { confidence: level('0.991') });
    expect(beyond.var).toBeNull();
    expect(beyond.notes).toMatchObject([{ figure: 'varInterval', code: 'levelBeyondResamples' }]);
    expect(beyond.notes[0]?.text).toContain('A bootstrap of 200 resamples cannot reach 99.1%');
  });
});
