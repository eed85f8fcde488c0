/** Simple: P[t]/P[t−1] − 1. Log: ln(P[t]/P[t−1]). Both are decimal fractions. */
export type ReturnType = 'simple' | 'log';
