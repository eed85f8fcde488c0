import type { RandomStreams } from '../../../terms/random.ts';
import { centralMoments } from '../../moments/centralMoments.ts';
import { jarqueBeraStatistic } from '../../moments/jarqueBera.ts';
import { nextNormal } from '../../random/draws.ts';
import { andersonDarling } from '../andersonDarling.ts';
import { parametricReplicates } from './parametricReplicates.ts';
import { normalTailOfAndersonDarling } from './symmetricTail.ts';

/** Both measures of how far a sample strays from the bell curve fitted to it. */
export type NormalShape = { readonly andersonDarling: number; readonly jarqueBera: number };

/** The fitted normal has the mean and the sample standard deviation (n − 1). Values that differ. */
export const normalShapeOf = (values: Float64Array): NormalShape => {
  const { mean, m2, m3, m4 } = centralMoments(values);
  const count = values.length;
  const sampleDeviation = Math.sqrt((m2 * count) / (count - 1));
  const ascending = values.map((value) => (value - mean) / sampleDeviation).sort();
  return {
    andersonDarling: andersonDarling(ascending, normalTailOfAndersonDarling),
    jarqueBera: jarqueBeraStatistic(
      { skewness: m3 / (m2 * Math.sqrt(m2)), excessKurtosis: m4 / (m2 * m2) - 3 },
      count,
    ),
  };
};

/** p of both by parametric bootstrap: (1 + #{simulated ≥ observed})/(B + 1), mean and deviation fitted to every sample. */
export const normalShapeProbabilities = (
  observed: NormalShape,
  count: number,
  streams: RandomStreams,
): NormalShape => {
  const sample = new Float64Array(count);
  let furtherAndersonDarling = 0;
  let furtherJarqueBera = 0;
  for (let replicate = 0; replicate < parametricReplicates; replicate += 1) {
    const random = streams.stream(replicate);
    for (let draw = 0; draw < count; draw += 1) sample[draw] = nextNormal(random);
    const simulated = normalShapeOf(sample);
    if (simulated.andersonDarling >= observed.andersonDarling) furtherAndersonDarling += 1;
    if (simulated.jarqueBera >= observed.jarqueBera) furtherJarqueBera += 1;
  }
  const probability = (further: number) => (1 + further) / (parametricReplicates + 1);
  return {
    andersonDarling: probability(furtherAndersonDarling),
    jarqueBera: probability(furtherJarqueBera),
  };
};
