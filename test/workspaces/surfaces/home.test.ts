import { describe, expect, test } from 'vitest';
import { homeReply, homeView } from '../../../src/present/views/homePage.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import { everythingAllowed, type Verdict } from '../../../src/workspaces/permissions.ts';
import { createHome } from '../../../src/workspaces/surfaces/home.ts';
import { brokenStore, recordsInMemory } from '../../doubles/records.ts';
import { demoDesk } from '../../e2e/demoDesk.ts';

const from = { team: 'T1', channel: null, person: 'U1', message: null, thread: null };
const asker = { place: 'direct' as const, from };
const inChannel = { place: 'channel' as const, from: { ...from, channel: 'C1', message: '1.5' } };

describe('the home of a person', () => {
  test('holds their digests twenty a page, and their own answers alone', async () => {
    const desk = await demoDesk();
    const converse = createConverse(desk);
    for (let made = 0; made < 23; made += 1)
      await converse.ask({ text: 'digest sessions 08:30 KELP', ...inChannel });
    await converse.ask({ text: 'interval KELP', ...inChannel });
    await converse.ask({ text: 'shape TARN', ...inChannel, from: { ...inChannel.from, person: 'U2' } });
    const home = createHome(desk);
    const [first, second, beyond] = [
      await home(asker, 0, null),
      await home(asker, 1, null),
      await home(asker, 9, null),
    ];
    expect([first.subscriptions.length, second.subscriptions.length, second.subscriptionCount]).toEqual([
      20, 3, 23,
    ]);
    expect(beyond.page).toBe(1);
    expect(first.recent.map(({ question }) => question)).toEqual(['interval KELP 60d at 95%']);
    expect((await home({ ...asker, from: { ...from, person: 'U3' } }, 0, null)).subscriptionCount).toBe(0);
  });

  test('leaves out answers that may not be read there', async () => {
    const desk = await demoDesk(true, {
      permissions: { ...everythingAllowed, mayRead: (_, { verb }) => verb !== 'interval' },
    });
    const converse = createConverse(desk);
    await converse.ask({ text: 'interval KELP', ...inChannel });
    await converse.ask({ text: 'interval vol KELP\nclaim KELP 20bp', ...inChannel });
    expect((await createHome(desk)(asker, 0, null)).recent.map(({ question }) => question)).toEqual([
      'claim KELP 20bp 60d at 95%',
    ]);
  });

  test.each([
    [{ ok: false, silent: true, message: '' }, 'Nothing is shown here.'],
    [{ ok: false, silent: false, message: 'Members only.' }, 'Members only.'],
  ] satisfies readonly (readonly [Verdict, string])[])(
    'of who is not answered tells nothing: %j',
    async (verdict, words) => {
      const desk = await demoDesk(true, { permissions: { ...everythingAllowed, mayAsk: () => verdict } });
      const page = await createHome(desk)(asker, 0, null);
      expect(homeView(page).blocks).toEqual([
        { type: 'section', text: { type: 'plain_text', text: words, emoji: false } },
      ]);
      expect(homeReply(page).sentence).toBe(words);
      expect(homeReply(page).passages).toEqual([]);
    },
  );

  test('says of the prices no more than may be asked', async () => {
    const mayAsk = (_: unknown, verb: string): Verdict =>
      verb === 'feed' ? { ok: false, silent: false, message: 'Not that here.' } : { ok: true };
    const desk = await demoDesk(true, { permissions: { ...everythingAllowed, mayAsk } });
    expect(await createHome(desk)(asker, 0, null)).toMatchObject({
      barred: null,
      feed: 'Not that here.',
      stale: null,
    });
  });

  test('says what is missing where the store is in trouble', async () => {
    const desk = { ...(await demoDesk()), records: await recordsInMemory({ store: { ...brokenStore } }) };
    expect((await createHome(desk)(asker, 0, null)).troubles).toEqual([
      'The store of records cannot be used.',
    ]);
  });
});
