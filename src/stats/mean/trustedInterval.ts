import { type Result, succeed, valueOrNull } from '../../terms/result.ts';
import type { MeanBootstrapQuestion } from './bootstrapQuestion.ts';
import type { Ends } from './ends.ts';
import { type MeanEvidence, meanEvidence } from './evidence.ts';
import { type MeanInterval, meanInterval } from './interval.ts';
import { type NeweyWestInterval, neweyWestInterval } from './neweyWestInterval.ts';
import { type StationaryInterval, stationaryBootstrapInterval } from './stationaryBootstrap.ts';
import { type StudentisedInterval, studentisedBootstrapInterval } from './studentisedBootstrap.ts';

/** Why one interval of the mean is trusted before the others. */
export const meanTrustReasons = {
  nothingAgainst: 'neither autocorrelation nor a lopsided distribution was found',
  plainTooNarrow: 'autocorrelation was found, and the plain interval is too narrow',
  plainTooWide: 'autocorrelation was found, and the plain interval is too wide',
  lopsided: 'the returns are few and lopsided, and the plain interval does not lean with them',
  outOfReach: 'the plain interval is in doubt, and the one that would replace it cannot be had',
} as const;

export type TrustedMeanInterval = Ends & {
  readonly trust: 'plain' | 'neweyWest' | 'bootstrap';
  readonly reason: keyof typeof meanTrustReasons;
  readonly plain: MeanInterval;
  readonly neweyWest: NeweyWestInterval | null;
  readonly bootstrap: StudentisedInterval | StationaryInterval | null;
  readonly evidence: MeanEvidence;
};

export type TrustedMeanQuestion = MeanBootstrapQuestion & { readonly bootstrapAsked?: boolean };

type Candidates = Omit<TrustedMeanInterval, 'trust' | 'reason' | 'lower' | 'upper'>;

const choose = (candidates: Candidates): Pick<TrustedMeanInterval, 'trust' | 'reason'> => {
  const { plain, neweyWest, bootstrap, evidence } = candidates;
  if (evidence.dependent) {
    if (neweyWest === null) return { trust: 'plain', reason: 'outOfReach' };
    const tooNarrow = neweyWest.standardError > plain.standardError;
    return { trust: 'neweyWest', reason: tooNarrow ? 'plainTooNarrow' : 'plainTooWide' };
  }
  if (!evidence.lopsided) return { trust: 'plain', reason: 'nothingAgainst' };
  return bootstrap === null
    ? { trust: 'plain', reason: 'outOfReach' }
    : { trust: 'bootstrap', reason: 'lopsided' };
};

const bootstrapFor = (question: TrustedMeanQuestion, evidence: MeanEvidence) => {
  if (!(evidence.dependent || evidence.lopsided || question.bootstrapAsked === true)) return null;
  return evidence.dependent
    ? valueOrNull(stationaryBootstrapInterval(question))
    : valueOrNull(studentisedBootstrapInterval(question));
};

/**
 * Which interval of the mean should be believed?
 * Convention: where robustAutocorrelation has p < 0.05, the Newey-West interval (with the stationary bootstrap beside it);
 * else, where |g1| > 2·√(6/n) and n < 100, the studentised bootstrap; else the plain one. The ends are the trusted one's.
 * Domain: at least 2 finite returns in time order that move; refused otherwise.
 * Units: those of the returns, per period; p-values in 0..1.
 * Edges: Newey-West needs 20 returns and a bootstrap 10; where the one that should be trusted cannot be had the plain one
 * stands with that doubt as its reason (`outOfReach`). Whether the plain one is too narrow or too wide is read from the
 * two standard errors.
 * Source: own rule, resting on the measured coverage of the four.
 * Example: trustedMeanInterval({ returns, level, side: 'both', streams }).trust is 'plain' for most windows.
 */
export const trustedMeanInterval = (question: TrustedMeanQuestion): Result<TrustedMeanInterval> => {
  const { returns, level, side } = question;
  const plain = meanInterval(returns, level, side);
  if (!plain.ok) return plain;
  const evidence = meanEvidence(returns);
  const candidates = {
    plain: plain.value,
    neweyWest: valueOrNull(neweyWestInterval(returns, level, side)),
    bootstrap: bootstrapFor(question, evidence),
    evidence,
  };
  const chosen = choose(candidates);
  const { lower, upper } = candidates[chosen.trust] ?? plain.value;
  return succeed({ ...chosen, lower, upper, ...candidates });
};
