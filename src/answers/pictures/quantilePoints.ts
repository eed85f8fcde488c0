import { bothFitted } from './fitted.ts';
import type { QuantilePoint } from './pictureData.ts';

/** The outermost returns are all shown; of those between, so many at even distances. */
const outermost = 40;
const between = 80;

const placesShown = (count: number): readonly number[] => {
  const inner = count - 2 * outermost;
  if (inner <= between) return Array.from({ length: count }, (_, place) => place);
  const steps = Array.from({ length: between }, (_, step) =>
    Math.round(outermost + (inner * (step + 0.5)) / between),
  );
  const ends = Array.from({ length: outermost }, (_, place) => place);
  return [...ends, ...steps, ...ends.map((place) => count - outermost + place)];
};

/** Each return against the quantiles of the fitted bell curve and t at (rank − ½)/n (Hazen 1914). */
export const quantilePoints = (returns: Float64Array): readonly QuantilePoint[] => {
  const ascending = returns.slice().sort();
  const { normal, student } = bothFitted(returns);
  return placesShown(ascending.length).map((place) => {
    const share = (place + 0.5) / ascending.length;
    return {
      observed: ascending[place] as number,
      normal: normal.quantile(share),
      student: student?.quantile(share) ?? null,
    };
  });
};
