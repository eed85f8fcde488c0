import type { FindingExample } from '../../../terms/feedReport.ts';
import type { Findings } from '../findings.ts';

export type CellPlace = Omit<FindingExample, 'value'>;

/** Whether a number can be a price at all. */
export const isPrice = (price: number | null): price is number =>
  price !== null && price > 0 && price < Number.POSITIVE_INFINITY;

/** Records why a cell holds no price. `unread` is its text where there is one that could not be read. */
export const recordNoPrice = (
  findings: Findings,
  place: CellPlace,
  price: number | null,
  unread: string | null,
): void => {
  if (price === null && unread === null) findings.record('blankPrice', place);
  else if (price === null) findings.record('unreadablePrice', { ...place, value: unread });
  else {
    const code = Number.isFinite(price) ? 'priceNotPositive' : 'priceNotFinite';
    findings.record(code, { ...place, value: String(price) });
  }
};
