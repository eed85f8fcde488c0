/**
 * A bot of its own process, to be killed: the built program’s workspace, inbox and deliveries on a real store, with a fast
 * clock, a conversation that says back what it hears, and digests that every copy says when they are due.
 */
import { randomUUID } from 'node:crypto';
import { connectPostgres } from '../../dist/records/openPostgres.js';
import { connectSqlite } from '../../dist/records/openSqlite.js';
import { reopening } from '../../dist/start/records/reopening.js';
import { makePlaces } from '../../dist/workspaces/slack/places/places.js';
import { seenInMemory } from '../../dist/workspaces/slack/seen.js';
import { startSlack } from '../../dist/workspaces/slack/start.js';
import { fastTime } from './fastTime.mjs';

const plan = JSON.parse(process.env.LEADSMAN_KILL_PLAN);
const time = fastTime(plan.epochMs, plan.speed);

const log = {
  info: () => {},
  warn: (message) => process.stderr.write(`warn: ${message}\n`),
  error: (message) => process.stderr.write(`error: ${message}\n`),
};

const wait = (delayMs) => new Promise((resolve) => time.after(delayMs, resolve));

const said = (text) => ({ text, blocks: [], kind: 'answer', private: false });

/** A question may name how many milliseconds its answer takes. */
const conversation = {
  converse: async ({ text }) => {
    await wait(Number(/takes (\d+)/.exec(text)?.[1] ?? 0));
    return [said(`Heard: ${text}`)];
  },
  press: async () => [],
  ready: async () => {},
  examples: async () => [said('Examples')],
};

const store = reopening(() => (plan.url === null ? connectSqlite(plan.path) : connectPostgres(plan.url)));

const started = await startSlack(
  {
    botToken: plan.botToken,
    apiUrl: plan.apiUrl,
    whenUnsure: 'leave',
    receiving: { mode: 'socket', appToken: plan.appToken, sockets: 2 },
  },
  {
    conversation,
    log,
    time,
    newId: randomUUID,
    seen: seenInMemory(),
    store,
    places: makePlaces(time, log),
    onNews: async () => {},
  },
);
if (!started.ok) throw new Error(started.problem.message);

/** Every copy is told of every digest that is due, and says it: which of them posts it is theirs to settle. */
const sayDigest = ({ key, channel }) =>
  started.value.deliveries.say({
    key,
    team: 'T0DESK',
    channel,
    threadTs: null,
    content: { text: `Digest ${key}`, blocks: [] },
    urgent: false,
    expiresAtMs: null,
  });

process.on('message', (digests) => {
  for (const digest of digests) void sayDigest(digest);
});
process.send('ready');
