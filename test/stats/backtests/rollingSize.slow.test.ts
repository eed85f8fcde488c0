import { describe, expect, test } from 'vitest';
import { rollingSizeMeasured } from '../../../src/stats/coverage/measured/rollingSize.ts';
import { level } from '../levels.ts';
import { measureSize } from './rollingSize.ts';

const histories = 250;

describe.each(['normal', 'studentT4', 'garchT'] as const)('rolling estimates on %s data', (process) => {
  const rows = measureSize(process, level('0.99'), 0, histories);
  const measured = rollingSizeMeasured.filter(([made]) => made === process);

  test('the same shares on other histories, within four standard errors of both', () => {
    rows.forEach(({ model, histories: judged, rate, rateError, kupiec }, index) => {
      const [, name, judgedThen, rateThen, kupiecThen] = measured[index] ?? [process, 'none', 0, 0, 0];
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
