import { describe, expect, test } from 'vitest';
import { trafficLight } from '../../../src/stats/backtests/trafficLight.ts';
import { coverageCase, levelOfFailure } from './coverageFixture.ts';

type Row = { readonly exceptions: number; readonly zone: 'green' | 'yellow' | 'red' };

describe('supervisory traffic light', () => {
  // Basel Committee 1996, table 2: zones from memory, recomputed from the binomial distribution.
  test.each(coverageCase<Row>('supervisory_traffic_light_250_days_99'))(
    '$exceptions exceedances in 250 days at 99% are $zone',
    ({ exceptions, zone }) => {
      expect(trafficLight(exceptions, 250, levelOfFailure(0.01))).toEqual({ zone, ourExtension: false });
    },
  );

  test('elsewhere it is our extension', () => {
    expect(trafficLight(3, 500, levelOfFailure(0.01))).toEqual({ zone: 'green', ourExtension: true });
    expect(trafficLight(3, 250, levelOfFailure(0.025))).toEqual({ zone: 'green', ourExtension: true });
  });

  test('none where fewer than 2.5 exceedances are expected', () => {
    expect(trafficLight(0, 249, levelOfFailure(0.01))).toBeNull();
    expect(trafficLight(9, 99, levelOfFailure(0.025))).toBeNull();
    expect(trafficLight(0, 100, levelOfFailure(0.025))).not.toBeNull();
  });

  test('no exceedance is green even where that is improbable', () => {
    expect(trafficLight(0, 100_000, levelOfFailure(0.01))?.zone).toBe('green');
  });
});
