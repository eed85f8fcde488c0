import { polynomial } from '../../numerics/polynomial.ts';

/*
 * Rational approximations of Cody 1969, Mathematics of Computation 23, 631-637, as printed in the author's public
 * program; ascending powers. `near`: erf(x)/x in x² for |x| ≤ 0.46875. `middle`: exp(x²)·erfc(x) for 0.46875 ≤ x ≤ 4.
 * `far`: the remainder of the asymptotic series in 1/x² for x ≥ 4.
 */
const nearTop = [
  3209.3775891384694, 377.485237685302, 113.86415415105014, 3.1611237438705655, 0.18577770618460315,
];
const nearBottom = [2844.236833439171, 1282.6165260773723, 244.02463793444417, 23.601290952344122, 1];
const middleTop = [
  1230.3393547979972, 2051.0783778260716, 1712.0476126340707, 881.952221241769, 298.6351381974001,
  66.11919063714163, 8.883149794388377, 0.5641884969886701, 2.1531153547440383e-8,
];
const middleBottom = [
  1230.3393548037495, 3439.3676741437216, 4362.619090143247, 3290.7992357334597, 1621.3895745666903,
  537.1811018620099, 117.6939508913125, 15.744926110709835, 1,
];
const farTop = [
  0.0006587491615298378, 0.016083785148742275, 0.12578172611122926, 0.36034489994980445, 0.30532663496123236,
  0.016315387137302097,
];
const farBottom = [
  0.0023352049762686918, 0.06051834131244132, 0.5279051029514285, 1.8729528499234604, 2.568520192289822, 1,
];

const inverseRootPi = 1 / Math.sqrt(Math.PI);
const rootHalfPi = Math.sqrt(Math.PI / 2);

/** erf(x)/x, for |x| ≤ 0.46875. */
export const errorFunctionShare = (x: number): number =>
  polynomial(nearTop, x * x) / polynomial(nearBottom, x * x);

/** exp(x²)·erfc(x), for x ≥ 0.46875. */
const scaledComplement = (x: number): number => {
  if (x <= 4) return polynomial(middleTop, x) / polynomial(middleBottom, x);
  const inverseSquare = 1 / (x * x);
  const remainder =
    (inverseSquare * polynomial(farTop, inverseSquare)) / polynomial(farBottom, inverseSquare);
  return (inverseRootPi - remainder) / x;
};

/** Upper tail probability of the standard normal over its density, for z ≥ 0. */
export const millsRatio = (z: number): number => {
  const x = z * Math.SQRT1_2;
  if (x > 0.46875) return rootHalfPi * scaledComplement(x);
  return rootHalfPi * Math.exp(x * x) * (1 - x * errorFunctionShare(x));
};
