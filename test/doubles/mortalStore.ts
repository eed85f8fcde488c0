import type { DurableStore } from '../../src/workspaces/slack/durable/ports.ts';

const never = new Promise<never>(() => {});

/** Functions that work until they are told to die, and then answer nothing any more. */
const mortal = <Part extends object>(part: Part, alive: () => boolean): Part =>
  new Proxy(part, {
    get: (target, name) => {
      const member: unknown = Reflect.get(target, name);
      if (typeof member !== 'function') return member;
      return (...given: unknown[]): unknown => (alive() ? Reflect.apply(member, target, given) : never);
    },
  });

/**
 * The same store as a process sees it that can be killed: from then on that process gets nothing done in it, as if it had
 * ended there, and what it held is not renewed.
 */
export const mortalStore = ({ inbox, deliveries }: DurableStore) => {
  let alive = true;
  const isAlive = () => alive;
  return {
    store: { inbox: mortal(inbox, isAlive), deliveries: mortal(deliveries, isAlive) },
    kill: (): void => {
      alive = false;
    },
  };
};
