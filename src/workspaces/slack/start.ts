import { App, webApi } from '@slack/bolt';
import { z } from 'zod';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { Deliveries } from '../deliveries.ts';
import { askedInMemory } from './asked.ts';
import type { Delivering } from './deliver.ts';
import { askedOnRecord } from './durable/asked.ts';
import { makeDurable } from './durable/start.ts';
import { listen } from './listen.ts';
import { inWords, libraryLog, maskedLog, silentLog } from './log.ts';
import type { Self } from './lookup.ts';
import { editPace, makePace, messagePace } from './pace.ts';
import { makeShow, type ShowPicture } from './pictures/show.ts';
import { makePinBoard, type PinBoard } from './pinBoard.ts';
import { lookupsOver } from './places/lookups.ts';
import type { SlackPorts } from './ports.ts';
import { makeVoice, type Voice } from './post.ts';
import { type Reception, receptionOf } from './receive.ts';
import { recentPresses } from './recent.ts';
import { makeRespond } from './respond.ts';
import { type Feature, featuresOf } from './scopes.ts';
import { callTimeoutMs, type SlackSettings } from './settings.ts';
import { makeSlots } from './slots.ts';
import { atMost } from './wait.ts';
import { makeWire, type Outcome, routed, type Wire } from './wire.ts';
import { makeWork } from './work.ts';

const stopLimitMs = 30_000;
/** So many posts that nobody waits for are under way at a time. */
const mostUnhurried = 4;

export type SlackWorkspace = {
  /** The workspace that the token is for. */
  readonly team: string;
  readonly features: ReadonlySet<Feature>;
  readonly voice: Voice;
  readonly deliveries: Deliveries;
  readonly showPicture: ShowPicture;
  readonly pinBoard: PinBoard;
  /** The port that requests come in at; null over sockets. */
  readonly port: number | null;
  /** Resolves once nothing is under way. */
  readonly idle: () => Promise<void>;
  /** Takes nothing new, finishes what is under way, and leaves. */
  readonly stop: () => Promise<void>;
};

type Identity = Self & { readonly team: string; readonly scopes: readonly string[] | null };

const identityShape = z.object({
  user_id: z.string(),
  bot_id: z.string(),
  team_id: z.string(),
  response_metadata: z.object({ scopes: z.array(z.string()).optional() }).optional(),
});

const unanswered = (outcome: Exclude<Outcome, { kind: 'done' }>): Result<never> =>
  outcome.kind === 'refused'
    ? refuse(
        problem(
          'settingWrong',
          `The platform refuses the bot token (${outcome.code}). Copy the token again from the app's settings.`,
        ),
      )
    : refuse(
        problem(
          'platformUnreachable',
          `The platform did not answer the first call (${outcome.kind}). Check the network and the platform's address, then start again.`,
        ),
      );

const identify = async (wire: Wire): Promise<Result<Identity>> => {
  const outcome = await wire.call('auth.test', {});
  if (outcome.kind !== 'done') return unanswered(outcome);
  const read = identityShape.safeParse(outcome.body);
  if (!read.success)
    return refuse(
      problem('settingWrong', 'The token is not one of a bot. Use the token that begins with xoxb-.'),
    );
  const { user_id: userId, bot_id: botId, team_id: team, response_metadata: more } = read.data;
  return succeed({ userId, botId, team, scopes: more?.scopes ?? null });
};

const open = async (reception: Reception): Promise<Result<null>> => {
  try {
    await reception.start();
    return succeed(null);
  } catch (error) {
    await reception.stop().catch(() => {});
    return refuse(
      problem(
        'platformUnreachable',
        `Nothing can be received from the platform (${inWords(error)}). Check the app token, or the address to listen at, then start again.`,
      ),
    );
  }
};

/** What the platform's client must not do by itself: it would post twice, and wait where others wait for it. */
const clientOptionsFor = ({ apiUrl }: SlackSettings) => ({
  retryConfig: { retries: 0 },
  rejectRateLimitedCalls: true,
  timeout: callTimeoutMs,
  allowAbsoluteUrls: false,
  ...(apiUrl === null ? {} : { slackApiUrl: apiUrl }),
});

/** Joins the workspace and answers there until it is stopped. */
export const startSlack = async (
  settings: SlackSettings,
  ports: SlackPorts,
): Promise<Result<SlackWorkspace>> => {
  const { botToken, receiving } = settings;
  const { conversation, time, newId, seen, store, places, onNews } = ports;
  const secret = receiving.mode === 'socket' ? receiving.appToken : receiving.signingSecret;
  const log = maskedLog(ports.log, [botToken, secret]);
  const clientOptions = clientOptionsFor(settings);
  const straight = makeWire(new webApi.WebClient(botToken, { ...clientOptions, logger: silentLog }));
  const identified = await identify(straight);
  if (!identified.ok) return identified;

  const { scopes, team, ...self } = identified.value;
  const wire = routed(straight, (channel) => places.currentId(team, channel));
  places.connect(lookupsOver(wire), self.userId);
  const features = featuresOf(scopes, log);
  const pace = makePace(time, messagePace);
  const canLookUp = features.has('lookUp');
  const slots = makeSlots(mostUnhurried);
  const { whenUnsure } = settings;
  const delivering: Delivering = { wire, pace, slots, time, log, self, canLookUp, whenUnsure };
  const voice = makeVoice(delivering, makePace(time, editPace));
  const work = makeWork();
  const showPicture = makeShow(features.has('picture'), wire, time, log);
  const respond = makeRespond(time, log, showPicture);
  const holder = newId();
  const durable = makeDurable({ store, holder, delivering, voice, respond, work, app: () => app });
  const { outbox: deliveries, inbox, memory } = durable;
  const reception = receptionOf(receiving, { self, inbox, work, time, log, clientOptions });
  const app: App = new App({
    receiver: reception,
    token: botToken,
    botId: self.botId,
    botUserId: self.userId,
    tokenVerificationEnabled: false,
    convoStore: false,
    logger: libraryLog(log),
    // The library writes into what it is given.
    clientOptions: { ...clientOptions },
  });
  const asked = askedOnRecord(askedInMemory(time), store, self);
  const said = { voice, deliveries, memory, showPicture, time, log, conversation, seen, asked, respond };
  const recent = recentPresses(time);
  listen(app, features, { ...said, self, places, onNews, wire, recent });
  const opened = await open(reception);
  if (!opened.ok) return opened;
  deliveries.start();
  inbox.start();

  const leave = async (): Promise<void> => {
    work.close();
    deliveries.close();
    inbox.close();
    await reception.stop();
    await atMost(time, stopLimitMs, work.idle());
    await inbox.stop();
    await deliveries.stop();
  };
  let leaving: Promise<void> | null = null;
  return succeed({
    team,
    features,
    voice,
    deliveries,
    showPicture,
    pinBoard: makePinBoard(wire, time),
    port: reception.port(),
    idle: work.idle,
    stop: () => {
      leaving ??= leave();
      return leaving;
    },
  });
};
