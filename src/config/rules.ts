import type { Settings } from './schema.ts';

/** Something wrong between settings that are each right alone. */
export type RuleBreach = { readonly path: string; readonly value: string; readonly message: string };

export type Rule = (settings: Settings) => readonly RuleBreach[];

/** In a wide file the date is the only column with a name of its own; the others are tickers. */
const columnNamesDiffer: Rule = ({ feed }) => {
  if (feed.shape === 'wide') return [];
  const seen = new Map<string, string>();
  const breaches: RuleBreach[] = [];
  for (const [column, name] of Object.entries(feed.columns)) {
    if (name === null) continue;
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

const wideHasNoOtherColumns: Rule = ({ feed }) => {
  if (feed.shape !== 'wide') return [];
  return (['adjustedClose', 'volume', 'currency'] as const).flatMap((column) => {
    const name = feed.columns[column];
    if (name === null) return [];
    const advice = 'in the wide shape every column beside the date is a ticker; use the long shape for it';
    return [{ path: `feed.columns.${column}`, value: name, message: advice }];
  });
};

const decimalMarkIsNotDelimiter: Rule = ({ feed: { format } }) =>
  format.decimalMark === 'comma' && format.delimiter === 'comma'
    ? [
        {
          path: 'feed.format.decimalMark',
          value: format.decimalMark,
          message:
            'the cells are separated by a comma too; files with a decimal comma have another delimiter',
        },
      ]
    : [];

export const rules: readonly Rule[] = [
  columnNamesDiffer,
  quoteUnitNeedsCurrency,
  wideHasNoOtherColumns,
  decimalMarkIsNotDelimiter,
];
