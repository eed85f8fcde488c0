/** What goes wrong with one call. `accepted`: the platform has done what was asked before the answer is lost. */
export type Fault =
  | { readonly kind: 'limited'; readonly retryAfterSeconds: number }
  | { readonly kind: 'status'; readonly status: number; readonly accepted: boolean }
  | { readonly kind: 'dropped'; readonly accepted: boolean }
  /** Nothing is ever answered. */
  | { readonly kind: 'silent'; readonly accepted: boolean }
  | { readonly kind: 'refused'; readonly error: string }
  | { readonly kind: 'warned'; readonly warning: string };

export type Faults = ReturnType<typeof makeFaults>;

/** Faults waiting for the next calls of a method, one each, in order. */
export const makeFaults = () => {
  const waiting = new Map<string, Fault[]>();
  return {
    next: (method: string, ...faults: readonly Fault[]): void => {
      waiting.set(method, [...(waiting.get(method) ?? []), ...faults]);
    },
    take: (method: string): Fault | null => waiting.get(method)?.shift() ?? null,
  };
};
