import type { Store } from '../../records/store.ts';
import type { Problem } from '../../terms/problem.ts';
import type { Result } from '../../terms/result.ts';

export type Reopening = Store & {
  /** What the store did wrong last, and has not done right since; null where it works or was never used. */
  readonly trouble: () => Problem | null;
};

/** A store that is opened when it is first used, and tried anew at each use for as long as it cannot be opened. */
export const reopening = (open: () => Promise<Result<Store>>): Reopening => {
  let opened: Promise<Result<Store>> | null = null;
  let trouble: Problem | null = null;

  const ready = async (): Promise<Result<Store>> => {
    opened ??= open();
    const store = await opened;
    if (!store.ok) opened = null;
    return store;
  };

  const using = async <T>(run: (store: Store) => Promise<Result<T>>): Promise<Result<T>> => {
    const store = await ready();
    const outcome = store.ok ? await run(store.value) : store;
    trouble = outcome.ok ? null : outcome.problem;
    return outcome;
  };

  return {
    contentOf: (id) => using((store) => store.contentOf(id)),
    keep: (answer, asking) => using((store) => store.keep(answer, asking)),
    find: (id) => using((store) => store.find(id)),
    list: (filter, most) => using((store) => store.list(filter, most)),
    page: (filter, afterNumber, most) => using((store) => store.page(filter, afterNumber, most)),
    verify: () => using((store) => store.verify()),
    forgetBefore: (beforeMs) => using((store) => store.forgetBefore(beforeMs)),
    backUp: (path) => using((store) => store.backUp(path)),
    close: async () => {
      const store = opened === null ? null : await opened;
      opened = null;
      if (store?.ok === true) await store.value.close();
    },
    trouble: () => trouble,
  };
};
