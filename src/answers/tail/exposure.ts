import type { Exposure } from '../../questions/question.ts';
import type { Money } from '../../terms/money.ts';
import type { PriceMeaning } from '../../terms/prices.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { ReturnType } from '../../terms/returns.ts';

export type Position = { readonly amount: Money | null; readonly position: 'long' | 'short' };

/** Pence and cents are hundredths of the currency that money is counted in. */
const unitsPerCurrency = ({ quoteUnit }: PriceMeaning): number => (quoteUnit === null ? 1 : 100);

const worth = (exposure: Exposure, lastClose: number, meaning: PriceMeaning): number =>
  exposure.kind === 'money' ? exposure.amount : (exposure.shares * lastClose) / unitsPerCurrency(meaning);

/** What a loss is reckoned on, in the ticker's own currency. A negative amount is a short position. */
export const positionOf = (
  exposure: Exposure | null,
  ticker: string,
  lastClose: number,
  meaning: PriceMeaning,
): Result<Position> => {
  if (exposure === null) return succeed({ amount: null, position: 'long' });
  const named = exposure.kind === 'money' ? exposure.currency : null;
  if (named !== null && meaning.currency !== null && named !== meaning.currency)
    return refuse(
      problem(
        'currencyMismatch',
        `${ticker} is quoted in ${meaning.currency}, and an amount in ${named} would need an exchange rate, which is not configured. Give the amount in ${meaning.currency}.`,
      ),
    );
  const currency = named ?? meaning.currency;
  if (currency === null)
    return refuse(
      problem(
        'currencyMismatch',
        `The currency of ${ticker} is not stated in the settings (feed.prices.currency). Name it with the amount, such as on 2m USD.`,
      ),
    );
  const amount = worth(exposure, lastClose, meaning);
  return succeed({ amount: { amount, currency }, position: amount < 0 ? 'short' : 'long' });
};

/** A loss as a fraction of the position turned into money; log returns add, so their money is exp(sum) − 1. */
export const moneyLoss = (
  loss: number | null,
  { amount, position }: Position,
  returnType: ReturnType,
): number | null => {
  if (loss === null || amount === null) return null;
  if (returnType === 'simple') return Math.abs(amount.amount) * loss;
  return Math.abs(amount.amount) * (position === 'long' ? -Math.expm1(-loss) : Math.expm1(loss));
};
