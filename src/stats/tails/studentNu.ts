import type { ProfileEnds } from './internal/studentProfiles.ts';
import type { StudentFit } from './studentFit.ts';
import type { Interval, TailFigureName, TailNote } from './tailFigures.ts';

/** The smallest nu in the range of the model. */
export const lowestNu = 0.5;

/** Ends of nu from those of 1/nu, so upper and lower change places; a bound is Infinity above and 0.5 below. */
export const nuIntervalOf = (inverseNu: ProfileEnds): Interval => ({
  lower:
    inverseNu.upper.kind === 'end'
      ? 1 / inverseNu.upper.figure
      : inverseNu.upper.kind === 'bound'
        ? lowestNu
        : null,
  upper:
    inverseNu.lower.kind === 'end'
      ? 1 / inverseNu.lower.figure
      : inverseNu.lower.kind === 'bound'
        ? Number.POSITIVE_INFINITY
        : null,
});

/** A note where a search for an end failed; nothing where both were found. */
export const notFoundNote = (figure: TailFigureName, ends: ProfileEnds): readonly TailNote[] =>
  ends.lower.kind === 'notFound' || ends.upper.kind === 'notFound'
    ? [
        {
          figure,
          code: 'profileNotConverged',
          text: 'The search for an end of this interval did not reach its stopping rule; that end is left out.',
          needs: null,
        },
      ]
    : [];

/** What a reader must know of a fit beside its figures. */
export const fitNotes = (fit: StudentFit, inverseNu: ProfileEnds): readonly TailNote[] => {
  const notes: TailNote[] = [...notFoundNote('parameters', inverseNu)];
  const note = (code: TailNote['code'], text: string) =>
    notes.push({ figure: 'parameters', code, text, needs: null });
  if (fit.normalLimit)
    note(
      'normalLimit',
      'No Student tail fits better than the bell curve: the fit is the normal distribution.',
    );
  if (fit.nuOnBound)
    note('parameterOnBound', `nu ended on ${lowestNu}, the lowest value of the model, and was held there.`);
  const lower = nuIntervalOf(inverseNu).lower;
  if (lower !== null && lower <= 2)
    note(
      'varianceMayNotBeFinite',
      'The interval of nu reaches 2: the variance of these returns may not be finite, and figures that rest on it may not settle.',
    );
  return notes;
};
