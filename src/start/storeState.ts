import type { Reopening } from './records/reopening.ts';

/** A store in trouble stops no answer, so the bot runs; whoever looks after it reads what is wrong. */
export const stateOf = (records: Pick<Reopening, 'trouble'>): string => {
  const trouble = records.trouble();
  return trouble === null ? 'running' : `running, but answers are not kept: ${trouble.message}`;
};
