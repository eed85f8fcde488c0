/** Which ends an interval has: both, or one end that the true figure lies above or below. */
export type Side = 'both' | 'above' | 'below';
