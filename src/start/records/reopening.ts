import { accessTo, type Connection, type Run } from '../../records/connection.ts';
import { copied, type Store, storeParts } from '../../records/store.ts';
import type { Problem } from '../../terms/problem.ts';
import type { Result } from '../../terms/result.ts';

export type Reopening = Store & {
  /** What the store did wrong last, and has not done right since; null where it works or was never used. */
  readonly trouble: () => Problem | null;
};

type Kind = 'read' | 'write';

/** Tells the operator that the store has begun to fail, with the reason, and null once it works again. */
export type TellTrouble = (trouble: Problem | null) => void;

/** What went wrong last with reading and with writing. A store that was written can be read too. */
const troubles = (tell: TellTrouble) => {
  const found: Record<Kind, Problem | null> = { read: null, write: null };
  const last = () => found.write ?? found.read;
  return {
    note: (kind: Kind, outcome: Result<unknown>): void => {
      const before = last();
      found[kind] = outcome.ok ? null : outcome.problem;
      if (kind === 'write' && outcome.ok) found.read = null;
      const after = last();
      if ((before === null) !== (after === null)) tell(after);
    },
    last,
  };
};

/** A store that is opened when it is first used, and tried anew at each use for as long as it cannot be opened. */
export const reopening = (
  connect: () => Promise<Result<Connection>>,
  tell: TellTrouble = () => {},
): Reopening => {
  let opened: Promise<Result<Connection>> | null = null;
  const trouble = troubles(tell);

  const ready = async (): Promise<Result<Connection>> => {
    const trying = opened ?? connect();
    opened = trying;
    const connection = await trying;
    // another use may have begun to try anew meanwhile
    if (!connection.ok && opened === trying) opened = null;
    return connection;
  };

  const using =
    (kind: Kind): Run =>
    async (work) => {
      const connection = await ready();
      const outcome = connection.ok ? await accessTo(connection.value)[kind](work) : connection;
      trouble.note(kind, outcome);
      return outcome;
    };

  return {
    ...storeParts({ read: using('read'), write: using('write') }),
    backUp: async (path) => {
      const connection = await ready();
      return connection.ok ? copied(connection.value, path) : connection;
    },
    close: async () => {
      const connection = opened === null ? null : await opened;
      opened = null;
      if (connection?.ok === true) await connection.value.close();
    },
    trouble: trouble.last,
  };
};
