import type { Saying, SayingOutcome } from '../terms/delivery.ts';

/** Says things in the workspace, each once. `say` resolves when it is settled, and survives restarts by the key. */
export type Deliveries = { readonly say: (saying: Saying) => Promise<SayingOutcome> };
