import { modelNamed } from '../recognisers/models.ts';

/** Words of the trade and of daily speech, with the words of the language that come nearest. For suggestions only. */
const nearest: ReadonlyMap<string, readonly string[]> = new Map([
  ['volatility', ['vol']],
  ['stdev', ['vol']],
  ['sd', ['vol']],
  ['deviation', ['vol']],
  ['sharpe', ['ratio']],
  ['average', ['mean']],
  ['return', ['']],
  ['returns', ['']],
  ['week', ['1w']],
  ['month', ['1m']],
  ['quarter', ['3m']],
  ['year', ['1y', 'a year']],
  ['annual', ['a year']],
  ['annualised', ['a year']],
  ['annualized', ['a year']],
  ['picture', ['as picture']],
  ['chart', ['as picture']],
  ['plot', ['as picture']],
  ['json', ['as json']],
  ['>', ['above']],
  ['<', ['below']],
]);

const decimalComma = /^([+-]?\d+),(\d{1,2}\D*)$/;

/** Texts that the word may have meant, the likeliest first. */
export const meantBy = (lower: string): readonly string[] => {
  const named = modelNamed(lower);
  if (named !== null) return [`by ${named}`];
  const comma = decimalComma.exec(lower);
  return comma === null ? (nearest.get(lower) ?? []) : [`${comma[1] ?? ''}.${comma[2] ?? ''}`];
};
