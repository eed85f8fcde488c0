/** The few functions of jStat 1.9.6 that give quantiles their start; the library carries no types of its own. */
declare module 'jstat' {
  const library: {
    readonly studentt: { readonly inv: (p: number, degreesOfFreedom: number) => number };
    readonly chisquare: { readonly inv: (p: number, degreesOfFreedom: number) => number };
    readonly beta: { readonly inv: (p: number, alpha: number, beta: number) => number };
  };
  export default library;
}
