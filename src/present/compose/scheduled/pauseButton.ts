import type { Button } from '../../reply.ts';

/** Whoever sees it may press it: pausing is for everybody in the place. */
export const pauseButton = (id: string, label: string): Button => ({
  action: 'pauseSubscription',
  label,
  answerId: id,
  question: '',
});
