import {
  awaitsFile,
  fileProcessingPauseMs,
  looksRefused,
  looksRefusedNote,
  plainly,
  textAlone,
} from './content.ts';
import { inWords } from './log.ts';
import { type ShowPicture, turnsOf } from './pictures/show.ts';
import type { Logger, SpokenReply, Time } from './ports.ts';
import { callTimeoutMs } from './settings.ts';
import { wait } from './wait.ts';
import type { Outcome } from './wire.ts';

/** A response address takes this many replies, for half an hour. */
const mostReplies = 5;
const retryMs = 1_000;

/** Who sees it: the one who typed or pressed, or everybody in the channel. */
type Audience = 'ephemeral' | 'in_channel';

const send = async (
  url: string,
  { text, blocks }: Pick<SpokenReply, 'text' | 'blocks'>,
  audience: Audience,
): Promise<Outcome> => {
  const looks = blocks.length === 0 ? {} : { blocks };
  const body = { response_type: audience, replace_original: false, text, ...looks, ...plainly };
  try {
    const response = await fetch(url, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify(body),
      redirect: 'error',
      signal: AbortSignal.timeout(callTimeoutMs),
    });
    const words = await response.text();
    if (response.ok) return { kind: 'done', body: {}, warnings: [] };
    if (response.status >= 500 || response.status === 429)
      return { kind: 'unsure', reason: `status ${response.status}` };
    return { kind: 'refused', code: words.slice(0, 80), details: [] };
  } catch (error) {
    return { kind: 'unsure', reason: inWords(error) };
  }
};

/** Replies through a response address, to a command, a form or a press on a private message: privately unless told otherwise. */
export const makeRespond = (time: Time, log: Logger, show: ShowPicture) => {
  /** An unclear answer is tried once more: a private reply that comes twice does less harm than one that never comes. */
  const respond = async (url: string, reply: SpokenReply, audience: Audience): Promise<void> => {
    let outcome = await send(url, reply, audience);
    if (outcome.kind === 'unsure' && audience === 'ephemeral') {
      await wait(time, retryMs);
      outcome = await send(url, reply, audience);
    }
    for (const firstMs = time.nowMs(); awaitsFile(outcome, reply, firstMs, time.nowMs()); ) {
      await wait(time, fileProcessingPauseMs);
      outcome = await send(url, reply, audience);
    }
    if (looksRefused(outcome, reply)) {
      log.error(looksRefusedNote(outcome));
      outcome = await send(url, textAlone(reply), audience);
    }
    if (outcome.kind === 'refused')
      log.error(`A reply through a response address was not delivered: ${outcome.code}.`);
    if (outcome.kind === 'unsure')
      log.error(`A reply through a response address may be lost: ${outcome.reason}.`);
  };

  return async (
    url: string,
    replies: readonly SpokenReply[],
    audience: Audience = 'ephemeral',
  ): Promise<void> => {
    const turns = turnsOf(replies, show);
    for (const turn of turns.slice(0, mostReplies)) await respond(url, await turn(), audience);
    if (turns.length > mostReplies) log.error(`${turns.length - mostReplies} private replies had no place.`);
  };
};

export type Respond = ReturnType<typeof makeRespond>;
