import { computeInline } from '../../src/start/compute/inline.ts';
import { computeInPool } from '../../src/start/compute/pool.ts';
import { computeContract } from '../contracts/compute.contract.ts';

computeContract('on the calling thread', computeInline);

/** Worker threads run the built program. */
computeContract('in worker threads', () =>
  computeInPool(new URL('../../dist/start/compute/worker.js', import.meta.url)),
);
