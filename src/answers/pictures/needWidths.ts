import { criticalT } from '../../stats/mean/criticalValues.ts';
import type { Level } from '../../terms/level.ts';
import type { NeedFigures } from '../need/figures.ts';
import type { NeedWidth } from './pictureData.ts';

const fewest = 10;
const points = 60;
/** How far beyond the counts that are needed the picture goes. */
const headroom = 6;

/** Half the width of the mean’s interval by the count of returns, at the deviation and the dependence that were found. */
export const needWidths = (figures: NeedFigures, level: Level): readonly NeedWidth[] => {
  const { sampleStandardDeviation, dependenceFactor, halfWidthReturns, detectReturnsUpper } = figures;
  const most = headroom * Math.max(halfWidthReturns, detectReturnsUpper, fewest);
  return Array.from({ length: points }, (_, step) => {
    const returnCount = fewest * (most / fewest) ** (step / (points - 1));
    const independent = Math.max(2, returnCount / dependenceFactor);
    const halfWidth =
      (criticalT(level, 'both', independent - 1) * sampleStandardDeviation) / Math.sqrt(independent);
    return { returnCount, halfWidth };
  });
};
