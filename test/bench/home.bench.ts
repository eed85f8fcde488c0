/** One page of the home of somebody with 100 digests. Goal: under 50 ms. */
import { bench, describe } from 'vitest';
import { homeView } from '../../src/present/views/homePage.ts';
import { createConverse } from '../../src/workspaces/converse.ts';
import { createHome } from '../../src/workspaces/surfaces/home.ts';
import { demoDesk } from '../e2e/demoDesk.ts';

const from = { team: 'T1', channel: 'C1', person: 'U1', message: null, thread: null };
const desk = await demoDesk();
const converse = createConverse(desk);
for (let made = 0; made < 100; made += 1)
  await converse.ask({ text: 'digest sessions 08:30 KELP TARN', place: 'channel', from });
const home = createHome(desk);
const asker = { place: 'direct' as const, from: { ...from, channel: null } };
const page = await home(asker, 1, null);
if (page.subscriptionCount !== 100 || page.subscriptions.length !== 20)
  throw new Error(`${page.subscriptionCount} digests were made`);

describe('the home of somebody with 100 digests', () => {
  bench('one page, composed as a view', async () => {
    homeView(await home(asker, 1, null));
  });
});
