import { webApi } from '@slack/bolt';
import { z } from 'zod';
import { inWords } from './log.ts';

/** What became of one call. */
export type Outcome =
  | {
      readonly kind: 'done';
      readonly body: Readonly<Record<string, unknown>>;
      readonly warnings: readonly string[];
    }
  /** Not done: too many calls. */
  | { readonly kind: 'limited'; readonly retryAfterMs: number }
  /** Not done: the platform says why. */
  | { readonly kind: 'refused'; readonly code: string; readonly details: readonly string[] }
  /** Not done: the platform was not reached. */
  | { readonly kind: 'unreached'; readonly reason: string }
  /** The answer is lost: it may be done or not. */
  | { readonly kind: 'unsure'; readonly reason: string };

/** One call of the platform's Web API, tried once. */
export type Wire = { readonly call: (method: string, args: Record<string, unknown>) => Promise<Outcome> };

/** Error codes after which, by the platform's own words, part of the work may have been done. */
const halfDone = new Set(['fatal_error', 'internal_error', 'service_unavailable', 'request_timeout']);
const limitCodes = new Set(['ratelimited', 'rate_limited']);
const neverArrived = new Set(['ECONNREFUSED', 'ENOTFOUND', 'EAI_AGAIN', 'UND_ERR_CONNECT_TIMEOUT']);
const waitWhereNoneIsSaidMs = 1_000;
const errorCode = /^[a-z0-9_]+$/;

const withCode = z.object({ code: z.string() });
const codeOfCause = (error: Error): string | null => {
  const read = withCode.safeParse(error.cause);
  return read.success ? read.data.code : null;
};

const refusalOf = (error: webApi.WebAPIPlatformError): Outcome => {
  const { error: code, response_metadata: more } = error.data;
  if (limitCodes.has(code)) {
    const seconds = more?.retryAfter;
    return { kind: 'limited', retryAfterMs: seconds === undefined ? waitWhereNoneIsSaidMs : seconds * 1_000 };
  }
  // A page of a proxy in the way reaches us as a code as well.
  if (halfDone.has(code) || !errorCode.test(code)) return { kind: 'unsure', reason: 'no clear answer' };
  return { kind: 'refused', code, details: more?.messages ?? [] };
};

export const outcomeOfError = (error: unknown): Outcome => {
  if (error instanceof webApi.WebAPIRateLimitedError)
    return { kind: 'limited', retryAfterMs: error.retryAfter * 1_000 };
  if (error instanceof webApi.WebAPIPlatformError) return refusalOf(error);
  if (error instanceof webApi.WebAPIHTTPError) {
    const reason = `status ${error.statusCode}`;
    return error.statusCode >= 500 || error.statusCode === 408
      ? { kind: 'unsure', reason }
      : { kind: 'refused', code: `http_${error.statusCode}`, details: [] };
  }
  if (error instanceof webApi.WebAPIRequestError) {
    const code = codeOfCause(error.original);
    if (code !== null && neverArrived.has(code)) return { kind: 'unreached', reason: code };
    return { kind: 'unsure', reason: code ?? inWords(error.original) };
  }
  return { kind: 'unsure', reason: inWords(error) };
};

/** The same wire, along which a channel is found under the id that it has now. */
export const routed = (wire: Wire, currentId: (channel: string) => string): Wire => ({
  call: (method, args) => {
    const { channel } = args;
    return wire.call(method, typeof channel === 'string' ? { ...args, channel: currentId(channel) } : args);
  },
});

export const makeWire = (client: webApi.WebClient): Wire => ({
  call: async (method, args) => {
    try {
      const { ok: _, ...body } = await client.apiCall(method, args);
      return { kind: 'done', body, warnings: body.response_metadata?.warnings ?? [] };
    } catch (error) {
      return outcomeOfError(error);
    }
  },
});
