import type { Touched } from '../digests/run/lookAgain.ts';
import type { PinStore } from '../records/pins.ts';
import type { Result } from '../terms/result.ts';
import type { Desk } from '../workspaces/desk.ts';
import type { News } from '../workspaces/news.ts';
import { finishCards, takenOff, tellOfChanges } from '../workspaces/pins/notes.ts';
import type { Places } from '../workspaces/slack/places/known.ts';
import type { Time } from '../workspaces/slack/ports.ts';

/** What it takes to follow what becomes of channels, people and pins. */
export type TendingParts = {
  readonly desk: Pick<Desk, 'records' | 'pins' | 'permissions' | 'snapshot'>;
  readonly store: {
    readonly pins: Pick<PinStore, 'moves' | 'moveChannel'>;
    readonly subscriptions: {
      readonly moveChannel: (team: string, from: string, to: string) => Promise<Result<number>>;
    };
  };
  readonly places: Places;
  /** Looks at what posts into a place, or for a person, of which there is news. */
  readonly lookAgain: (touched: Touched) => Promise<void>;
  readonly time: Time;
  readonly tell: (message: string) => void;
};

/** New prices are noticed, and what other copies of the bot heard, so often. */
export const tendEveryMs = 60_000;

/** Follows what becomes of channels, people and pins until it is stopped. */
export const tendWorkspace = ({ desk, store, places, lookAgain, time, tell }: TendingParts) => {
  let stopped = false;
  let callOff = (): void => {};
  let fingerprint: string | null = null;

  const noted = <T>(outcome: Result<T>, what: string): void => {
    if (!outcome.ok) tell(`${what}: ${outcome.problem.message}`);
  };

  const learnMoves = async (): Promise<void> => {
    const moves = await store.pins.moves();
    if (moves.ok) for (const { team, from, to } of moves.value) places.moved(team, from, to);
  };

  const tellOfPrices = async (): Promise<void> => {
    const live = desk.snapshot();
    if (!live.ok || live.value.fingerprint === fingerprint) return;
    await tellOfChanges(desk, live.value);
    ({ fingerprint } = live.value);
  };

  const tend = async (first: boolean): Promise<void> => {
    try {
      await learnMoves();
      if (first) await finishCards(desk);
      await tellOfPrices();
    } catch (error) {
      tell(`Tending the workspace failed: ${error instanceof Error ? error.message : String(error)}`);
    }
    if (stopped) return;
    callOff = time.after(tendEveryMs, () => {
      tending = tend(false);
    });
  };
  let tending = tend(true);

  return {
    hear: async (news: News): Promise<void> => {
      const { kind, team } = news;
      if (kind === 'pinRemoved') return takenOff(desk, team, news.channel, news.ts);
      if (kind === 'personChanged') return lookAgain({ owner: news.person });
      if (kind === 'channelChanged') return lookAgain({ channel: news.channel });
      const { from, to } = news;
      noted(await store.pins.moveChannel({ team, from, to }), `The new id of ${from} was not noted`);
      noted(await store.subscriptions.moveChannel(team, from, to), `What posts in ${from} was not moved`);
      return lookAgain({ channel: to });
    },
    stop: async (): Promise<void> => {
      stopped = true;
      callOff();
      await tending;
    },
  };
};
