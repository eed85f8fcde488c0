import { createStreams } from '../../src/stats/random/xoshiro128.ts';
import type { RandomStreams } from '../../src/terms/random.ts';

/** Reproducible streams for a test; different marks give unrelated numbers. */
export const testStreams = (mark: number): RandomStreams => createStreams(new Uint8Array(32).fill(mark));
