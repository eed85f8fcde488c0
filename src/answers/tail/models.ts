import type { TailModel, TailQuestion } from '../../questions/question.ts';
import { type Result, refuse } from '../../terms/result.ts';
import type { Note } from '../answer.ts';
import type { Position } from './exposure.ts';
import type { RefusedModel } from './figures.ts';
import type { AnyTailFigures, RanModel, RanTail } from './runModels.ts';

const allModels: readonly TailModel[] = ['historical', 'normal', 'student', 'filtered', 'peaks'];
/** Which figure leads where none was asked for: the one that allows for fat tails with the fewest returns first. */
const leadingOrder: readonly TailModel[] = ['student', 'historical', 'normal', 'filtered', 'peaks'];

export const modelsOf = ({ model }: Pick<TailQuestion, 'model'>): readonly TailModel[] =>
  model === null ? allModels : [model];

/** The first of the given models that has a figure, in the order in which they lead. */
export const leadingOf = <Figures extends { readonly ok: true; readonly model: TailModel }>(
  models: readonly (Figures | RefusedModel)[],
): Figures | null => {
  for (const name of leadingOrder) {
    const found = models.find((each): each is Figures => each.ok && each.model === name);
    if (found !== undefined) return found;
  }
  return null;
};

/** A question about one model is refused with that model’s reason; of five, the others still answer. */
export const refusedAltogether = (models: readonly RanModel<unknown>[]): Result<never> | null => {
  const [first] = models;
  return first !== undefined && models.every(({ result }) => !result.ok) && !first.result.ok
    ? refuse(first.result.problem)
    : null;
};

export const modelNotes = (
  ran: readonly RanModel<{ readonly notes: AnyTailFigures['notes'] }>[],
): readonly Note[] =>
  ran.flatMap(({ model, result }): readonly Note[] =>
    result.ok
      ? result.value.notes.map(({ figure, code, text }) => ({
          figure: `${model}.${figure}`,
          code,
          text: `${model}: ${text}`,
        }))
      : [{ figure: model, code: result.problem.code, text: `${model}: ${result.problem.message}` }],
  );

/** Returns as the holder of the position has them: a short position loses when the price rises. */
export const returnsOfPosition = (returns: Float64Array, { position }: Position): Float64Array =>
  position === 'long' ? returns : returns.map((value) => -value);

/** What the simulation of several days has to say beside its figures. */
export const horizonNotes = (ran: readonly RanTail[]): readonly Note[] =>
  modelNotes(ran.flatMap(({ model, horizon }) => (horizon === null ? [] : [{ model, result: horizon }])));
