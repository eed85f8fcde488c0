import { describe, expect, it } from 'vitest';
import { editPace, makePace, messagePace } from '../../../src/workspaces/slack/pace.ts';
import { manualTime } from '../../doubles/time.ts';

/** Lets everything that is ready run on. */
const breathe = () => new Promise((resolve) => setImmediate(resolve));

const setUp = (rule = { burst: 2, intervalMs: 1_000 }) => {
  const time = manualTime(0);
  const pace = makePace(time, rule);
  const turns: string[] = [];
  const ask = (lane: string, name: string) => void pace.turn(lane).then(() => turns.push(name));
  const advance = async (byMs: number) => {
    for (let passed = 0; passed < byMs; passed += 100) {
      time.advance(100);
      await breathe();
    }
  };
  return { pace, turns, ask, advance };
};

describe('pace', () => {
  it('lets a burst through and then one turn per interval, in order', async () => {
    const { turns, ask, advance } = setUp();
    for (const name of ['a', 'b', 'c', 'd']) ask('one', name);
    await breathe();
    expect(turns).toEqual(['a', 'b']);
    await advance(900);
    expect(turns).toEqual(['a', 'b']);
    await advance(100);
    expect(turns).toEqual(['a', 'b', 'c']);
    await advance(1_000);
    expect(turns).toEqual(['a', 'b', 'c', 'd']);
  });

  it('serves those first for whom a person waits, whenever they came', async () => {
    const { pace, turns, ask, advance } = setUp();
    for (const name of ['a', 'b', 'c', 'd']) ask('one', name);
    await breathe();
    void pace.turn('one', true).then(() => turns.push('urgent'));
    await advance(1_000);
    expect(turns).toEqual(['a', 'b', 'urgent']);
    await advance(2_000);
    expect(turns).toEqual(['a', 'b', 'urgent', 'c', 'd']);
  });

  it('keeps lanes apart', async () => {
    const { turns, ask } = setUp();
    for (const name of ['a', 'b', 'c']) ask('one', name);
    ask('two', 'x');
    await breathe();
    expect(turns.sort()).toEqual(['a', 'b', 'x']);
  });

  it('serves nobody while it is held, and keeps the order', async () => {
    const { pace, turns, ask, advance } = setUp();
    pace.hold('one', 5_000);
    pace.hold('one', 2_000);
    ask('one', 'a');
    ask('one', 'b');
    await advance(4_900);
    expect(turns).toEqual([]);
    await advance(100);
    expect(turns).toEqual(['a', 'b']);
  });

  it('gives a turn on the spot only where one is free', async () => {
    const { pace, advance } = setUp();
    expect([pace.tryTurn('one'), pace.tryTurn('one'), pace.tryTurn('one')]).toEqual([true, true, false]);
    await advance(1_000);
    expect(pace.tryTurn('one')).toBe(true);
  });

  it.each([
    // The platform's published figures: about one message a second in a channel, 50 edits a minute in a workspace.
    ['messages', messagePace, 60 + messagePace.burst],
    ['edits', editPace, 50],
  ])('of %s stays within what the platform takes in a minute', async (_, rule, most) => {
    const { turns, ask, advance } = setUp(rule);
    for (let count = 0; count < 100; count += 1) ask('one', String(count));
    await advance(60_000);
    expect(turns.length).toBeLessThanOrEqual(most);
    expect(turns.length).toBeGreaterThan(most - 10);
  });
});
