import type { Saying, SayingOutcome } from '../../src/terms/delivery.ts';
import type { Speaking } from '../../src/workspaces/slack/answer.ts';

type Noted = Pick<Speaking, 'deliveries' | 'memory'> & { readonly said: readonly Saying[] };

/** Takes everything that is said, once for each key, and remembers no earlier try at anything. */
export const notedDeliveries = (): Noted => {
  const said: Saying[] = [];
  const say = async (saying: Saying): Promise<SayingOutcome> => {
    if (!said.some(({ key }) => key === saying.key)) said.push(saying);
    return { kind: 'said', ts: '9.000001' };
  };
  return {
    said,
    deliveries: { say, sayAgain: say },
    memory: {
      recall: async () => ({ again: false, standing: null, editing: null, replied: false }),
      willEdit: async () => {},
    },
  };
};
