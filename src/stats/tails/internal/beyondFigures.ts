import type { BeyondFigures, Interval, IntervalMethod, TailModelName, TailNote } from '../tailFigures.ts';

/** Figures of a long-run model's chance of a loss. */
export const beyondFigures = (
  model: TailModelName,
  probability: number,
  interval: Interval | null,
  intervalMethod: IntervalMethod,
  notes: readonly TailNote[],
): BeyondFigures => ({
  model,
  target: 'unconditional',
  probability,
  interval,
  intervalMethod: interval === null ? null : intervalMethod,
  meanReturnSessions: Number.isFinite(1 / probability) ? 1 / probability : null,
  notes,
});
