import type { TailModelName } from '../../stats/tails/tailFigures.ts';
import type { Money } from '../../terms/money.ts';
import type { ProblemCode } from '../../terms/problem.ts';

/** JSON has no infinity; a parameter that is infinite is this word. */
export type NumberOrInfinity = number | 'infinity';

export type ParameterValue = NumberOrInfinity | boolean | string | null;

/** A model that gave no figure stands beside the others with its reason. */
export type RefusedModel = {
  readonly model: TailModelName;
  readonly ok: false;
  readonly problem: { readonly code: ProblemCode; readonly message: string; readonly needs: number | null };
};

/** How often an interval like this one held the truth in simulations; null where that was not measured. */
export type MeasuredShare = { readonly var: number | null; readonly es: number | null };

/** One model's figures: losses as positive decimal fractions over the horizon, money as positive losses. */
export type TailModelFigures = {
  readonly model: TailModelName;
  readonly ok: true;
  readonly var: number;
  readonly varLower: number | null;
  readonly varUpper: number | null;
  readonly varIntervalMethod: string | null;
  readonly varAttainedLevel: number | null;
  readonly es: number | null;
  readonly esLower: number | null;
  readonly esUpper: number | null;
  readonly esIntervalMethod: string | null;
  readonly target: 'unconditional' | 'nextDay';
  readonly measuredCoverage: MeasuredShare;
  readonly monteCarloError: { readonly var: number; readonly es: number | null } | null;
  /** The trade's shortcut √h·(VaR + m) − h·m beside a simulated horizon; null for one day. */
  readonly shortcutVar: number | null;
  readonly varMoney: number | null;
  readonly esMoney: number | null;
  readonly parameters: Readonly<Record<string, ParameterValue>>;
};

export type TailFigures = {
  readonly tailLevel: number;
  readonly confidenceLevel: number;
  readonly horizonDays: number;
  readonly amount: Money | null;
  /** A short position loses when the price rises: the other tail is used. */
  readonly position: 'long' | 'short';
  readonly models: readonly (TailModelFigures | RefusedModel)[];
};

export type BeyondModelFigures = {
  readonly model: TailModelName;
  readonly ok: true;
  readonly probability: number;
  readonly lower: number | null;
  readonly upper: number | null;
  readonly intervalMethod: string | null;
  readonly meanReturnSessions: number | null;
  /** How often an interval like this one held the true chance in simulations; null where that was not measured. */
  readonly measuredCoverage: number | null;
  readonly target: 'unconditional' | 'nextDay';
};

export type BeyondFigures = {
  readonly threshold: number;
  readonly confidenceLevel: number;
  readonly position: 'long' | 'short';
  readonly models: readonly (BeyondModelFigures | RefusedModel)[];
  /** The days of the window on which it happened. */
  readonly days: readonly string[];
};
