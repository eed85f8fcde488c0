import { webApi } from '@slack/bolt';
import { describe, expect, it } from 'vitest';
import { outcomeOfError } from '../../../src/workspaces/slack/wire.ts';

const platformError = (error: string, more: object = {}) =>
  new webApi.WebAPIPlatformError({ ok: false, error, ...more });
const requestError = (code: string) =>
  new webApi.WebAPIRequestError(new TypeError('fetch failed', { cause: { code } }));
const httpError = (status: number) => new webApi.WebAPIHTTPError(status, '', {}, '');

describe('an error of the client', () => {
  it.each([
    ['says no', platformError('not_in_channel'), { kind: 'refused', code: 'not_in_channel' }],
    ['says no with a status', httpError(403), { kind: 'refused', code: 'http_403' }],
    ['asks to wait', new webApi.WebAPIRateLimitedError(7), { kind: 'limited', retryAfterMs: 7_000 }],
    ['asks to wait in words', platformError('ratelimited'), { kind: 'limited', retryAfterMs: 1_000 }],
    [
      'asks to wait in words, and says how long',
      platformError('rate_limited', { response_metadata: { retryAfter: 3 } }),
      { kind: 'limited', retryAfterMs: 3_000 },
    ],
    ['never arrived', requestError('ECONNREFUSED'), { kind: 'unreached' }],
    ['has no address', requestError('ENOTFOUND'), { kind: 'unreached' }],
    ['broke off', requestError('ECONNRESET'), { kind: 'unsure' }],
    ['took too long', new webApi.WebAPIRequestError(new Error('timeout')), { kind: 'unsure' }],
    ['failed over there', httpError(503), { kind: 'unsure' }],
    ['may have been half done', platformError('fatal_error'), { kind: 'unsure' }],
    ['came as a page', platformError('<html>Bad gateway</html>'), { kind: 'unsure' }],
    ['is of another kind', new Error('no idea'), { kind: 'unsure' }],
  ])('that %s', (_, error, outcome) => {
    expect(outcomeOfError(error)).toMatchObject(outcome);
  });

  it('keeps what the platform says about blocks', () => {
    const messages = ['[ERROR] must be more than 0 characters'];
    expect(outcomeOfError(platformError('invalid_blocks', { response_metadata: { messages } }))).toEqual({
      kind: 'refused',
      code: 'invalid_blocks',
      details: messages,
    });
  });
});
