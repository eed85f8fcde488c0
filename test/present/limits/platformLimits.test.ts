import { expect, test } from 'vitest';
import { platformLimits } from '../../../src/present/limits/platformLimits.ts';
import published from '../../fixtures/platform/limits.json' with { type: 'json' };

// Expected figures: the platform's published pages, as carried in test/fixtures/platform/limits.json.
test('the figures are those that the platform publishes, all that concern messages and views', () => {
  const { source: _source, rates: _rates, events: _events, ...ofMessagesAndViews } = published;
  expect(platformLimits).toEqual(ofMessagesAndViews);
});
