import { createHmac } from 'node:crypto';
import type { Delivery, Transport } from './deliveries.ts';

export type Signing = {
  /** The secret it is signed with; another one than the app's makes a wrong signature. */
  readonly secret: string;
  /** How old the request claims to be. */
  readonly ageSeconds: number;
};

/**
 * v0 signature: HMAC-SHA256 of `v0:timestamp:body`. The timestamp comes from the machine's clock, against which the
 * receiving library checks it.
 */
const signed = (body: string, { secret, ageSeconds }: Signing) => {
  const timestamp = Math.floor(Date.now() / 1000) - ageSeconds;
  const digest = createHmac('sha256', secret).update(`v0:${timestamp}:${body}`).digest('hex');
  return { 'x-slack-request-timestamp': String(timestamp), 'x-slack-signature': `v0=${digest}` };
};

const flat = (payload: Record<string, unknown>): Record<string, string> =>
  Object.fromEntries(Object.entries(payload).map(([name, value]) => [name, String(value)]));

const written = ({ kind, payload }: Delivery) => {
  if (kind === 'events_api') return { type: 'application/json', body: JSON.stringify(payload) };
  const fields = kind === 'slash_commands' ? flat(payload) : { payload: JSON.stringify(payload) };
  return { type: 'application/x-www-form-urlencoded', body: new URLSearchParams(fields).toString() };
};

/** One signed request to the app; the status it answered with. */
export const sendRequest = async (
  url: string,
  delivery: Delivery,
  signing: Signing,
  attempt = 0,
): Promise<{ readonly status: number; readonly body: string }> => {
  const { type, body } = written(delivery);
  const retry = attempt === 0 ? {} : { 'x-slack-retry-num': String(attempt) };
  const reason = attempt === 0 ? {} : { 'x-slack-retry-reason': 'http_timeout' };
  const headers = { 'content-type': type, ...signed(body, signing), ...retry, ...reason };
  const response = await fetch(url, { method: 'POST', headers, body });
  return { status: response.status, body: await response.text() };
};

/** Requests to the app's public address instead of a socket. */
export const requestTransport =
  (url: string, secret: string): Transport =>
  (delivery, attempt, answered) => {
    sendRequest(url, delivery, { secret, ageSeconds: 0 }, attempt).then(
      ({ status, body }) => answered(status === 200 ? body : null),
      () => answered(null),
    );
  };
