import { type Day, isoFromDay } from './day.ts';

/** Which returns a question is about, before the feed has been looked at. */
export type Window =
  | { readonly kind: 'returns'; readonly count: number }
  | { readonly kind: 'span'; readonly amount: number; readonly unit: 'week' | 'month' | 'year' }
  | { readonly kind: 'yearToDate' }
  | { readonly kind: 'all' }
  | { readonly kind: 'since'; readonly day: Day }
  | { readonly kind: 'between'; readonly from: Day; readonly to: Day };

const unitLetter = { week: 'w', month: 'm', year: 'y' } as const;

/** The window as the question language writes it: `60d`, `3m`, `since 2026-05-04`. */
export const windowText = (window: Window): string => {
  switch (window.kind) {
    case 'returns':
      return `${window.count}d`;
    case 'span':
      return `${window.amount}${unitLetter[window.unit]}`;
    case 'yearToDate':
      return 'ytd';
    case 'all':
      return 'all';
    case 'since':
      return `since ${isoFromDay(window.day)}`;
    case 'between':
      return `${isoFromDay(window.from)}/${isoFromDay(window.to)}`;
  }
};
