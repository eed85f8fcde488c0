import type { Settings } from './schema.ts';

/** Something wrong between settings that are each right alone. */
export type RuleBreach = { readonly path: string; readonly value: string; readonly message: string };

export type Rule = (settings: Settings) => readonly RuleBreach[];

const columnNamesDiffer: Rule = ({ feed }) => {
  const seen = new Map<string, string>();
  const breaches: RuleBreach[] = [];
  for (const [column, name] of Object.entries(feed.columns)) {
    const other = seen.get(name);
    if (other === undefined) seen.set(name, column);
    else {
      const message = `it is also feed.columns.${other}; every column has a name of its own`;
      breaches.push({ path: `feed.columns.${column}`, value: name, message });
    }
  }
  return breaches;
};

const message = 'a quote unit is a hundredth of a currency, so the currency must be given too';

const quoteUnitNeedsCurrency: Rule = ({ feed }) => {
  const { currency, quoteUnit } = feed.prices;
  const forAll =
    quoteUnit !== null && currency === null
      ? [{ path: 'feed.prices.quoteUnit', value: quoteUnit, message }]
      : [];
  const forOne = Object.entries(feed.tickers).flatMap(([ticker, meaning]) => {
    const unit = meaning.quoteUnit;
    const known = meaning.currency === undefined ? currency : meaning.currency;
    return typeof unit === 'string' && known === null
      ? [{ path: `feed.tickers.${ticker}.quoteUnit`, value: unit, message }]
      : [];
  });
  return [...forAll, ...forOne];
};

export const rules: readonly Rule[] = [columnNamesDiffer, quoteUnitNeedsCurrency];
