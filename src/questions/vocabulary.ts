import { closestWords } from './closestWords.ts';
import type { Vocabulary } from './context.ts';

/** Two tickers that differ in case alone can only be typed exactly: neither answers to another spelling. */
const tickersByLowerCase = (tickers: readonly string[]): ReadonlyMap<string, string | null> => {
  const byLower = new Map<string, string | null>();
  for (const ticker of tickers) {
    const lower = ticker.toLowerCase();
    byLower.set(lower, byLower.has(lower) ? null : ticker);
  }
  return byLower;
};

/** The vocabulary of a feed with these tickers. `cities` maps the desk's names of cities to IANA time zones. */
export const createVocabulary = (
  tickers: readonly string[],
  cities: ReadonlyMap<string, string> = new Map(),
): Vocabulary => {
  const exact = new Set(tickers);
  const byLower = tickersByLowerCase(tickers);
  return {
    canonicalTicker: (word) => (exact.has(word) ? word : (byLower.get(word.toLowerCase()) ?? null)),
    nearest: (word, count) => closestWords(word, tickers, count),
    cities: new Map([...cities].map(([city, zone]) => [city.toLowerCase(), zone])),
  };
};
