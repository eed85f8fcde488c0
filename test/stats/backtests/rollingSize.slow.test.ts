import { describe, expect, test } from 'vitest';
import { level } from '../levels.ts';
import { measureSize, type SizeProcess } from './rollingSize.ts';

// What estimation does to the coverage verdict at 99%, 250 days estimated on and 250 judged, measured by measureSize over
// 1,000 histories (replicates 100,000 to 100,999): histories in which the model was judged, share of days beyond VaR
// (1% promised), share of histories that the chi-square verdict rejects at 5% (9.48% with the true VaR).
const measured: Readonly<Record<SizeProcess, readonly (readonly [string, number, number, number])[]>> = {
  normal: [
    ['historical', 1000, 0.01171, 0.055],
    ['normal', 1000, 0.01022, 0.095],
    ['student', 1000, 0.0097, 0.099],
    ['filtered', 1000, 0.01166, 0.027],
    ['peaks', 486, 0.01126, 0.0617],
  ],
  studentT4: [
    ['historical', 1000, 0.01184, 0.053],
    ['normal', 1000, 0.01622, 0.133],
    ['student', 1000, 0.01078, 0.086],
    ['filtered', 1000, 0.01171, 0.03],
    ['peaks', 838, 0.0115, 0.0525],
  ],
  garchT: [
    ['historical', 1000, 0.01336, 0.195],
    ['normal', 1000, 0.01876, 0.303],
    ['student', 1000, 0.0126, 0.237],
    ['filtered', 1000, 0.01191, 0.033],
    ['peaks', 779, 0.01309, 0.2003],
  ],
};

const histories = 250;

describe.each(['normal', 'studentT4', 'garchT'] as const)('rolling estimates on %s data', (process) => {
  const rows = measureSize(process, level('0.99'), 0, histories);

  test('the same shares on other histories, within four standard errors of both', () => {
    rows.forEach(({ model, histories: judged, rate, rateError, kupiec }, index) => {
      const [name, judgedThen, rateThen, kupiecThen] = measured[process][index] ?? ['none', 0, 0, 0];
      expect(model).toBe(name);
      const both = Math.sqrt(1 + histories / 1000);
      expect(Math.abs(rate - rateThen)).toBeLessThan(4 * both * rateError);
      const error = Math.sqrt((kupiecThen * (1 - kupiecThen)) / judged);
      expect(Math.abs(kupiec - kupiecThen)).toBeLessThan(4 * both * error);
      const share = judgedThen / 1000;
      const shareError = Math.sqrt((share * (1 - share)) / histories);
      expect(Math.abs(judged / histories - share)).toBeLessThanOrEqual(4 * both * shareError);
    });
  });

  if (process === 'garchT') return;

  test('historical on independent days: the next loss ranks above the 248th of 251 with chance 1 − 248/251', () => {
    const historical = rows.find(({ model }) => model === 'historical');
    // Days of one history share estimation windows, so the error is that over histories; four of them.
    const error = historical?.rateError ?? 0;
    expect(Math.abs((historical?.rate ?? 1) - (1 - 248 / 251))).toBeLessThan(4 * error);
  });
});
