import { halfStepRatio, logOneAndSquareShare } from './studentTail.ts';

/** The density of Student's t for 0 < nu < Infinity. */
export const studentDensity = (t: number, nu: number): number => {
  const constant = halfStepRatio(nu / 2) / Math.sqrt(nu * Math.PI);
  return constant * Math.exp(-((nu + 1) / 2) * logOneAndSquareShare(Math.abs(t), nu));
};
