import { parameter, parameterCount, presampleVariance } from './garchLikelihood.ts';
import { unitStudentConstant } from './studentConstant.ts';
import { innovationTerms, term } from './studentInnovation.ts';

/** One day's variance with its derivatives; the second derivatives that are always zero or equal are left out. */
const slot = { h: 0, m: 1, w: 2, a: 3, b: 4, mm: 5, ma: 6, mb: 7, wb: 8, ab: 9, bb: 10 } as const;
const slotCount = 11;

/**
 * Steps h and its derivatives one day on, from h' = ω + α·e² + β·h. `slope` and `bend` are the first two derivatives of e²
 * in mu. The derivative in ln ω twice equals the one once; (mu, ln ω), (ln ω, α) and (α, α) start at zero and stay there.
 */
const advance = (
  s: Float64Array,
  omega: number,
  alpha: number,
  beta: number,
  squared: number,
  slope: number,
  bend: number,
): void => {
  s[slot.mm] = alpha * bend + beta * (s[slot.mm] as number);
  s[slot.ma] = slope + beta * (s[slot.ma] as number);
  s[slot.mb] = (s[slot.m] as number) + beta * (s[slot.mb] as number);
  s[slot.wb] = (s[slot.w] as number) + beta * (s[slot.wb] as number);
  s[slot.ab] = (s[slot.a] as number) + beta * (s[slot.ab] as number);
  s[slot.bb] = 2 * (s[slot.b] as number) + beta * (s[slot.bb] as number);
  s[slot.m] = alpha * slope + beta * (s[slot.m] as number);
  s[slot.w] = omega + beta * (s[slot.w] as number);
  s[slot.a] = squared + beta * (s[slot.a] as number);
  s[slot.b] = (s[slot.h] as number) + beta * (s[slot.b] as number);
  s[slot.h] = omega + alpha * squared + beta * (s[slot.h] as number);
};

const place = (row: number, column: number): number => row * parameterCount + column;
const { mu: m, logOmega: w, alpha: a, beta: b, inverseNu: v } = parameter;
const at = {
  mm: place(m, m),
  mw: place(m, w),
  ma: place(m, a),
  mb: place(m, b),
  mv: place(m, v),
  ww: place(w, w),
  wa: place(w, a),
  wb: place(w, b),
  wv: place(w, v),
  aa: place(a, a),
  ab: place(a, b),
  av: place(a, v),
  bb: place(b, b),
  bv: place(b, v),
  vv: place(v, v),
} as const;

const add = (sums: Float64Array, index: number, amount: number): void => {
  sums[index] = (sums[index] as number) + amount;
};

/** Adds one day's gradient; returns nothing but the sums. `inH` and `inE` are the slopes of the log-density in h and e. */
const addGradient = (
  sums: Float64Array,
  s: Float64Array,
  inH: number,
  inE: number,
  inInverseNu: number,
): void => {
  add(sums, m, inH * (s[slot.m] as number) - inE);
  add(sums, w, inH * (s[slot.w] as number));
  add(sums, a, inH * (s[slot.a] as number));
  add(sums, b, inH * (s[slot.b] as number));
  add(sums, v, inInverseNu);
};

/** Adds one day's second derivatives (upper triangle), by the chain rule through h(mu, ln ω, α, β) and e = r − mu. */
const addHessian = (
  sums: Float64Array,
  s: Float64Array,
  terms: Float64Array,
  inH: number,
  e: number,
): void => {
  const h = s[slot.h] as number;
  const q = (e * e) / h;
  const tq = terms[term.q] as number;
  const tqq = terms[term.qq] as number;
  const inHH = (0.5 - q * (2 * tq + q * tqq)) / (h * h);
  const inHE = (2 * e * (tq + q * tqq)) / (h * h);
  const inHV = ((terms[term.qInverseNu] as number) * q) / h;
  const hm = s[slot.m] as number;
  const hw = s[slot.w] as number;
  const ha = s[slot.a] as number;
  const hb = s[slot.b] as number;
  const cross = inHH * hm - inHE;
  add(sums, at.mm, hm * (cross - inHE) + inH * (s[slot.mm] as number) - (2 / h) * (tq + 2 * q * tqq));
  add(sums, at.mw, cross * hw);
  add(sums, at.ma, cross * ha + inH * (s[slot.ma] as number));
  add(sums, at.mb, cross * hb + inH * (s[slot.mb] as number));
  add(sums, at.mv, inHV * hm + ((terms[term.qInverseNu] as number) * 2 * e) / h);
  add(sums, at.ww, inHH * hw * hw + inH * hw);
  add(sums, at.wa, inHH * hw * ha);
  add(sums, at.wb, inHH * hw * hb + inH * (s[slot.wb] as number));
  add(sums, at.wv, inHV * hw);
  add(sums, at.aa, inHH * ha * ha);
  add(sums, at.ab, inHH * ha * hb + inH * (s[slot.ab] as number));
  add(sums, at.av, inHV * ha);
  add(sums, at.bb, inHH * hb * hb + inH * (s[slot.bb] as number));
  add(sums, at.bv, inHV * hb);
  add(sums, at.vv, -(terms[term.inverseNuTwice] as number));
};

/**
 * The log-likelihood with its analytic first and second derivatives, written into the two arrays (the
 * Hessian row by row). The variance before the first day, S, moves with mu and counts: S' = −2·mean e, S'' = 2.
 */
export const differentiateGarch = (
  returns: Float64Array,
  point: Float64Array,
  gradient: Float64Array,
  hessian: Float64Array,
): number => {
  const mu = point[m] as number;
  const omega = Math.exp(point[w] as number);
  const alpha = point[a] as number;
  const beta = point[b] as number;
  const inverseNu = point[v] as number;
  gradient.fill(0);
  hessian.fill(0);
  const terms = new Float64Array(6);
  const s = new Float64Array(slotCount);
  let squared = presampleVariance(returns, mu);
  let slope = presampleSlope(returns, mu);
  s[slot.h] = squared;
  s[slot.m] = slope;
  s[slot.mm] = 2;
  let loss = 0;
  for (let day = 0; day < returns.length; day += 1) {
    advance(s, omega, alpha, beta, squared, slope, 2);
    const e = (returns[day] as number) - mu;
    const h = s[slot.h] as number;
    squared = e * e;
    slope = -2 * e;
    innovationTerms(squared / h, inverseNu, terms);
    const tq = terms[term.q] as number;
    const inH = (tq * (squared / h) - 0.5) / h;
    loss += Math.log(h) / 2 + (terms[term.value] as number);
    addGradient(gradient, s, inH, (-2 * tq * e) / h, -(terms[term.inverseNu] as number));
    addHessian(hessian, s, terms, inH, e);
  }
  const constant = unitStudentConstant(inverseNu);
  add(gradient, v, returns.length * constant.slope);
  add(hessian, at.vv, returns.length * constant.curvature);
  mirror(hessian);
  const value = returns.length * constant.value - loss;
  return Number.isNaN(value) ? -Infinity : value;
};

const presampleSlope = (returns: Float64Array, mu: number): number => {
  let sum = 0;
  for (let day = 0; day < returns.length; day += 1) sum += (returns[day] as number) - mu;
  return (-2 * sum) / returns.length;
};

const mirror = (hessian: Float64Array): void => {
  for (let row = 1; row < parameterCount; row += 1) {
    for (let column = 0; column < row; column += 1) {
      hessian[place(row, column)] = hessian[place(column, row)] as number;
    }
  }
};
