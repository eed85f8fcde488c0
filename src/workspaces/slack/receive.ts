import { type App, HTTPReceiver, type Receiver, SocketModeReceiver, type webApi } from '@slack/bolt';
import { concernsBot } from './heard.ts';
import { libraryLog } from './log.ts';
import type { Self } from './lookup.ts';
import type { Inbox, Logger, Time } from './ports.ts';
import type { Receiving } from './settings.ts';
import { keepSocket } from './sockets.ts';
import type { Work } from './work.ts';

/** Where the platform sends its events and presses in HTTP mode. */
export const requestPath = '/slack/events';

export type Reception = Receiver & {
  /** The port that requests come in at; null over sockets. */
  readonly port: () => number | null;
};

export type Receptionist = {
  readonly self: Self;
  readonly inbox: Inbox;
  readonly work: Work;
  readonly time: Time;
  readonly log: Logger;
  readonly clientOptions: webApi.WebClientOptions;
};

/**
 * The app as its receivers see it. The library acknowledges an event before anything of ours runs, and what is
 * acknowledged never comes again: so what arrives is kept first. Where keeping fails it is not acknowledged.
 */
const keepingFirst = (app: App, { self, inbox, work }: Receptionist): App => {
  const front: App = Object.create(app);
  front.processEvent = (event) =>
    work.track(async () => {
      if (!concernsBot(event.body, self)) return app.processEvent(event);
      const dealing = await inbox.keep({ body: event.body, retryNumber: event.retryNum ?? 0 });
      if (dealing === null) return event.ack();
      if (dealing.kept) await app.processEvent(event);
      else {
        await app.processEvent({ ...event, ack: async () => {} });
        await event.ack();
      }
      await dealing.done();
    });
  return front;
};

/** Several sockets, so that events have a way in while one of them is opened anew. */
const socketReception = (appToken: string, sockets: number, desk: Receptionist): Reception => {
  const receivers = Array.from(
    { length: sockets },
    () =>
      new SocketModeReceiver({
        appToken,
        logger: libraryLog(desk.log),
        autoReconnectEnabled: false,
        installerOptions: { clientOptions: { ...desk.clientOptions } },
      }),
  );
  const kept = receivers.map((receiver) => keepSocket(receiver, desk.time, desk.log));
  return {
    init: (app) => {
      for (const receiver of receivers) receiver.init(keepingFirst(app, desk));
    },
    start: () => Promise.all(kept.map((socket) => socket.start())),
    stop: () => Promise.all(kept.map((socket) => socket.stop())),
    port: () => null,
  };
};

const httpReception = (signingSecret: string, host: string, port: number, desk: Receptionist): Reception => {
  const receiver = new HTTPReceiver({
    signingSecret,
    endpoints: requestPath,
    logger: libraryLog(desk.log),
  });
  let listening: number | null = null;
  return {
    init: (app) => receiver.init(keepingFirst(app, desk)),
    start: async () => {
      const server = await receiver.start({ host, port });
      const address = server.address();
      listening = typeof address === 'object' && address !== null ? address.port : null;
    },
    stop: () => receiver.stop(),
    port: () => listening,
  };
};

export const receptionOf = (receiving: Receiving, desk: Receptionist): Reception =>
  receiving.mode === 'socket'
    ? socketReception(receiving.appToken, receiving.sockets, desk)
    : httpReception(receiving.signingSecret, receiving.host, receiving.port, desk);
