import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { createStreams } from '../../../src/stats/random/xoshiro128.ts';
import type { GarchProcess } from '../../../src/stats/volatility/garchPath.ts';

/** Daily returns of a GARCH(1,1) process with unit-variance Student innovations, 500 days after its start. */
export const simulateGarchReturns = (
  count: number,
  process: GarchProcess,
  nu: number,
  replicate: number,
): Float64Array => {
  const random = createStreams(new Uint8Array(32).fill(11)).stream(replicate);
  const scale = nu === Number.POSITIVE_INFINITY ? 1 : Math.sqrt((nu - 2) / nu);
  const returns = new Float64Array(count);
  let variance = process.omega / (1 - process.alpha - process.beta);
  for (let day = -500; day < count; day += 1) {
    const deviation = Math.sqrt(variance) * scale * nextStudentT(random, nu);
    if (day >= 0) returns[day] = process.mu + deviation;
    variance = process.omega + process.alpha * deviation * deviation + process.beta * variance;
  }
  return returns;
};
