/**
 * How good was one day's VaR, by the loss function that the true quantile minimises?
 *
 * Convention: (l − V)·(a − 1{l < V}) with the loss l and VaR V at level a; lower is better.
 * Domain: any finite loss and VaR; the level as a fraction in (0, 1).
 * Units: decimal fractions in and out.
 * Edges: a loss equal to the VaR scores 0.
 * Source: Koenker & Bassett 1978, Econometrica 46, 33-50.
 * Example: quantileLoss(0.05, 0.03, 0.99) is 0.0198; quantileLoss(0.01, 0.03, 0.99) is 0.0002.
 */
export const quantileLoss = (loss: number, valueAtRisk: number, levelFraction: number): number =>
  (loss - valueAtRisk) * (loss < valueAtRisk ? levelFraction - 1 : levelFraction);

/**
 * How good were one day's VaR and ES together?
 *
 * Convention: 1{l > V}·(l − V)/((1 − a)·E) + V/E + ln E − 1, the member of the Fissler-Ziegel family whose differences do
 * not depend on the unit; lower is better.
 * Domain: ES E > 0; tail fraction 1 − a in (0, 1). E ≤ 0 is the caller's to exclude and throws here.
 * Units: decimal fractions in, a number without unit out (its level depends on the unit of the loss, differences do not).
 * Edges: a loss equal to the VaR counts as not beyond it.
 * Source: Patton, Ziegel & Chen 2019, Journal of Econometrics 211, 388-413, the loss they call FZ0, signs turned from
 * returns to losses.
 * Example: jointLoss(0.05, 0.03, 0.04, 0.01) is 50 + 0.75 + ln 0.04 − 1 = 46.53.
 */
export const jointLoss = (
  loss: number,
  valueAtRisk: number,
  expectedShortfall: number,
  tailFraction: number,
): number => {
  if (!(expectedShortfall > 0))
    throw new RangeError(`jointLoss: ES must be positive, got ${expectedShortfall}`);
  const beyond = loss > valueAtRisk ? (loss - valueAtRisk) / (tailFraction * expectedShortfall) : 0;
  return beyond + valueAtRisk / expectedShortfall + Math.log(expectedShortfall) - 1;
};
