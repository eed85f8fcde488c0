import type { TailModel } from '../../questions/question.ts';
import { filteredBeyond } from '../../stats/tails/filtered/filteredBeyond.ts';
import { filteredKinds } from '../../stats/tails/filtered/filteredKinds.ts';
import { type FilteredTailFigures, filteredTail } from '../../stats/tails/filtered/filteredTail.ts';
import { historicalBeyond } from '../../stats/tails/historicalBeyond.ts';
import { type HistoricalTailFigures, historicalTail } from '../../stats/tails/historicalTail.ts';
import {
  type HorizonFigures,
  type HorizonInput,
  horizonTail,
} from '../../stats/tails/horizon/horizonTail.ts';
import { normalBeyond } from '../../stats/tails/normalBeyond.ts';
import { type NormalTailFigures, normalTail } from '../../stats/tails/normalTail.ts';
import { peaksBeyond } from '../../stats/tails/peaks/peaksBeyond.ts';
import { type PeaksTailFigures, peaksTail } from '../../stats/tails/peaks/peaksTail.ts';
import { studentBeyond } from '../../stats/tails/studentBeyond.ts';
import { type StudentTailFigures, studentTail } from '../../stats/tails/studentTail.ts';
import type { BeyondFigures, BeyondInput, TailInput } from '../../stats/tails/tailFigures.ts';
import type { Result } from '../../terms/result.ts';

export type AnyTailFigures =
  | HistoricalTailFigures
  | NormalTailFigures
  | StudentTailFigures
  | FilteredTailFigures
  | PeaksTailFigures;

/** A model's one-day figures and, where more days were asked, the simulated ones. */
export type RanTail = RanModel<AnyTailFigures> & { readonly horizon: Result<HorizonFigures> | null };

export type RanModel<Figures> = { readonly model: TailModel; readonly result: Result<Figures> };

/** Each model by its name; filtered can be two, where its two kinds meet. */
const tailModels: Readonly<Record<TailModel, (input: TailInput) => readonly Result<AnyTailFigures>[]>> = {
  historical: (input) => [historicalTail(input)],
  normal: (input) => [normalTail(input)],
  student: (input) => [studentTail(input)],
  filtered: (input) => filteredKinds(input.returns.length).map((kind) => filteredTail(input, { kind })),
  peaks: (input) => [peaksTail(input)],
};

const beyondModels: Readonly<Record<TailModel, (input: BeyondInput) => Result<BeyondFigures>>> = {
  historical: historicalBeyond,
  normal: normalBeyond,
  student: (input) => studentBeyond(input),
  filtered: (input) => filteredBeyond(input),
  peaks: peaksBeyond,
};

export type HorizonAsked = Pick<HorizonInput, 'horizonDays' | 'returnType' | 'position'>;

const horizonOf = (
  result: Result<AnyTailFigures>,
  input: TailInput,
  asked: HorizonAsked,
): Result<HorizonFigures> | null =>
  result.ok && asked.horizonDays > 1 ? horizonTail(result.value, { ...input, ...asked }) : null;

export const runTails = (
  models: readonly TailModel[],
  input: TailInput,
  asked: HorizonAsked,
): readonly RanTail[] =>
  models.flatMap((model) =>
    tailModels[model](input).map((result) => ({ model, result, horizon: horizonOf(result, input, asked) })),
  );

export const runBeyond = (
  models: readonly TailModel[],
  input: BeyondInput,
): readonly RanModel<BeyondFigures>[] =>
  models.map((model) => ({ model, result: beyondModels[model](input) }));
