import type { IncomingMessage } from 'node:http';
import type { Duplex } from 'node:stream';
import { type WebSocket, WebSocketServer } from 'ws';
import { z } from 'zod';
import type { Transport } from './deliveries.ts';
import { bot } from './workspace.ts';

const acknowledgement = z.object({ envelope_id: z.string(), payload: z.unknown() });

const greeting = (connections: number) => ({
  type: 'hello',
  num_connections: connections,
  connection_info: { app_id: bot.appId },
  debug_info: { host: 'double', started: '', build_number: 0, approximate_connection_time: 18_060 },
});

type Pending = { readonly socket: WebSocket; readonly settle: (answer: unknown) => void };

/** The open connections, and a way to wait until there are so many. */
const makeConnections = () => {
  const open: WebSocket[] = [];
  const watchers: { readonly count: number; readonly resolve: () => void }[] = [];
  let turn = 0;
  const tell = () => {
    for (const watcher of watchers) if (open.length === watcher.count) watcher.resolve();
  };
  return {
    open,
    add: (socket: WebSocket): void => {
      open.push(socket);
      tell();
    },
    drop: (socket: WebSocket): void => {
      open.splice(0, open.length, ...open.filter((other) => other !== socket));
      tell();
    },
    /** Any open connection may be handed any envelope: here each in turn. */
    next: (): WebSocket | undefined => {
      turn += 1;
      return open[turn % Math.max(open.length, 1)];
    },
    reached: (count: number): Promise<void> =>
      new Promise((resolve) => {
        watchers.push({ count, resolve });
        tell();
      }),
  };
};

/** Envelopes that were handed over and not yet acknowledged. */
const makePending = () => {
  const pending = new Map<string, Pending>();
  const settle = (envelopeId: string, answer: unknown): void => {
    pending.get(envelopeId)?.settle(answer);
    pending.delete(envelopeId);
  };
  return {
    add: (envelopeId: string, waiting: Pending): void => {
      pending.set(envelopeId, waiting);
    },
    settle,
    lose: (socket: WebSocket): void => {
      for (const [id, waiting] of pending) if (waiting.socket === socket) settle(id, null);
    },
  };
};

/** The far end of Socket Mode. */
export const makeSockets = (newId: (prefix: string) => string) => {
  const server = new WebSocketServer({ noServer: true });
  const tickets = new Set<string>();
  const connections = makeConnections();
  const pending = makePending();
  let mute = false;

  const welcome = (socket: WebSocket) => {
    socket.on('close', () => {
      connections.drop(socket);
      pending.lose(socket);
    });
    socket.on('message', (data) => {
      if (mute) return;
      const { envelope_id, payload } = acknowledgement.parse(JSON.parse(data.toString()));
      pending.settle(envelope_id, payload ?? {});
    });
    socket.send(JSON.stringify(greeting(connections.open.length + 1)));
    connections.add(socket);
  };

  const send: Transport = (delivery, attempt, answered) => {
    const socket = connections.next();
    if (socket === undefined) {
      answered(null);
      return;
    }
    const envelope = {
      envelope_id: newId('E'),
      type: delivery.kind,
      payload: delivery.payload,
      accepts_response_payload: delivery.kind !== 'events_api',
    };
    const again = attempt === 0 ? {} : { retry_attempt: attempt, retry_reason: 'timeout' };
    pending.add(envelope.envelope_id, { socket, settle: answered });
    socket.send(JSON.stringify({ ...envelope, ...again }));
  };

  const cut = () => {
    for (const socket of [...connections.open]) socket.terminate();
  };

  return {
    send,
    newTicket: (): string => {
      const ticket = newId('K');
      tickets.add(ticket);
      return ticket;
    },
    upgrade: (ticket: string, request: IncomingMessage, stream: Duplex, head: Buffer): void => {
      if (tickets.delete(ticket)) server.handleUpgrade(request, stream, head, welcome);
      else stream.end('HTTP/1.1 408 Request Timeout\r\n\r\n');
    },
    /** Resolves once exactly this many connections are open. */
    connected: connections.reached,
    /** Asks every client to connect anew, as the platform does every few hours. */
    refresh: (): void => {
      for (const socket of connections.open)
        socket.send(JSON.stringify({ type: 'disconnect', reason: 'refresh_requested' }));
    },
    /** Breaks every connection without a word. */
    cut,
    /** Acknowledgements get lost from now on, or arrive again. */
    loseAcknowledgements: (lost: boolean): void => {
      mute = lost;
    },
    close: (): void => {
      cut();
      server.close();
    },
  };
};
