import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';

test('the demonstration prices are what their script writes, byte for byte', () => {
  const script = new URL('../tools/makeDemoPrices.mjs', import.meta.url).pathname;
  const written = execFileSync(process.execPath, [script, '--print'], { maxBuffer: 10_000_000 });
  const kept = readFileSync(new URL('../../config/demo-prices.csv', import.meta.url));
  expect(written.equals(kept)).toBe(true);
});
