/**
 * Tickers that a person may be typing: those that begin with the letters first, then those that hold them, each in the
 * order of the feed; case does not matter.
 */
export const tickersLike = (typed: string, tickers: readonly string[], most: number): readonly string[] => {
  const wanted = typed.trim().toLowerCase();
  if (wanted === '') return tickers.slice(0, most);
  const beginning: string[] = [];
  const holding: string[] = [];
  for (const ticker of tickers) {
    const place = ticker.toLowerCase().indexOf(wanted);
    if (place === 0) beginning.push(ticker);
    else if (place > 0 && holding.length < most) holding.push(ticker);
    if (beginning.length === most) break;
  }
  return [...beginning, ...holding].slice(0, most);
};
