/** ln(x/a) − (x − a)/a for x, a > 0: zero where both are equal, negative elsewhere, without cancellation near zero. */
export const logRatioMinusShare = (x: number, a: number): number => {
  const share = (x - a) / a;
  return share > 0.6 || share < -0.4 ? Math.log(x / a) - share : logOnePlusMinus(share);
};

/** ln(1 + x) − x for −0.4 ≤ x ≤ 0.6, without the cancellation near 0. */
const logOnePlusMinus = (x: number): number => {
  // ln(1+x) = 2·artanh(s) with s = x/(2+x), and 2s − x = −s·x
  const s = x / (2 + x);
  const square = s * s;
  let sum = 0;
  let power = 2 * s * square;
  for (let odd = 3; odd < 80; odd += 2) {
    const term = power / odd;
    sum += term;
    if (Math.abs(term) < 1e-17 * Math.abs(sum)) break;
    power *= square;
  }
  return sum - s * x;
};
