import type { IncomingMessage, ServerResponse } from 'node:http';
import { fromForm, Refused } from './arguments.ts';
import type { Desk, Methods } from './desk.ts';
import type { Fault, Faults } from './faults.ts';
import { chat } from './methods/chat.ts';
import { conversations } from './methods/conversations.ts';
import { files } from './methods/files.ts';
import { pins } from './methods/pins.ts';
import { views } from './methods/views.ts';
import { workplace } from './methods/workplace.ts';
import type { Arguments } from './records.ts';
import { scopeNeeded } from './scopes.ts';

const botMethods: Methods = { ...chat, ...conversations, ...files, ...pins, ...views, ...workplace };

export type Tokens = {
  readonly bot: string;
  readonly app: string;
  readonly scopes: readonly string[];
};

export type WebApi = {
  readonly desk: Desk;
  readonly tokens: Tokens;
  readonly faults: Faults;
  /** An address for one Socket Mode connection. */
  readonly newSocketAddress: () => string;
  /** How long a call is under way, before and again after it is done. */
  readonly latency: () => Promise<void>;
};

export const bodyOf = async (request: IncomingMessage): Promise<Buffer> => {
  const parts: Buffer[] = [];
  for await (const part of request) parts.push(Buffer.from(part));
  return Buffer.concat(parts);
};

const tokenOf = (request: IncomingMessage): string =>
  /^Bearer (\S+)$/.exec(request.headers.authorization ?? '')?.[1] ?? '';

const run = (api: WebApi, method: string, token: string, args: Arguments): Record<string, unknown> => {
  if (token === '') throw new Refused('not_authed');
  if (method === 'apps.connections.open') {
    if (token !== api.tokens.app) throw new Refused('invalid_auth');
    return { url: api.newSocketAddress() };
  }
  if (token !== api.tokens.bot) throw new Refused('invalid_auth');
  const known = botMethods[method];
  if (known === undefined) throw new Refused('unknown_method');
  const scope = scopeNeeded(api.desk, method, args);
  if (scope !== null && !api.tokens.scopes.includes(scope)) throw new Refused('missing_scope');
  return known(api.desk, args);
};

type Reply = { readonly body: Record<string, unknown>; readonly outcome: string };

const refusal = (refused: Refused): Reply => ({
  outcome: refused.code,
  body: {
    ok: false,
    error: refused.code,
    ...(refused.details.length === 0 ? {} : { response_metadata: { messages: refused.details } }),
  },
});

const replyTo = (api: WebApi, method: string, token: string, args: Arguments): Reply => {
  try {
    return { outcome: 'ok', body: { ok: true, ...run(api, method, token, args) } };
  } catch (error) {
    if (error instanceof Refused) return refusal(error);
    throw error;
  }
};

const withWarning = (reply: Reply, warning: string): Reply => ({
  ...reply,
  body: { ...reply.body, warning, response_metadata: { warnings: [warning] } },
});

const send = (response: ServerResponse, api: WebApi, reply: Reply): void => {
  response.setHeader('content-type', 'application/json; charset=utf-8');
  response.setHeader('x-oauth-scopes', api.tokens.scopes.join(','));
  response.end(JSON.stringify(reply.body));
};

/** Does what the fault says; the result is what became of the call. */
const spoil = (fault: Fault, response: ServerResponse, api: WebApi, accept: () => Reply): string => {
  if (fault.kind === 'limited') {
    response.writeHead(429, { 'retry-after': String(fault.retryAfterSeconds) }).end();
    return 'limited';
  }
  if (fault.kind === 'refused') {
    send(response, api, refusal(new Refused(fault.error)));
    return fault.error;
  }
  if (fault.kind === 'warned') {
    const reply = accept();
    send(response, api, withWarning(reply, fault.warning));
    return reply.outcome;
  }
  const done = fault.accepted ? accept().outcome : 'nothing';
  if (fault.kind === 'dropped') response.destroy();
  else if (fault.kind === 'status') response.writeHead(fault.status).end();
  return `${fault.kind}, ${done} done`;
};

export const answerCall = async (
  api: WebApi,
  method: string,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> => {
  const args = fromForm((await bodyOf(request)).toString());
  const accept = () => replyTo(api, method, tokenOf(request), args);
  const fault = api.faults.take(method);
  await api.latency();
  if (fault === null) {
    const reply = accept();
    api.desk.records.calls.add({ method, args, outcome: reply.outcome });
    await api.latency();
    send(response, api, reply);
  } else {
    const outcome = spoil(fault, response, api, accept);
    api.desk.records.calls.add({ method, args, outcome });
  }
};
