import type { IncomingMessage, ServerResponse } from 'node:http';
import limits from '../../fixtures/platform/limits.json' with { type: 'json' };
import { Refused, words } from './arguments.ts';
import { contentOf } from './content.ts';
import type { Desk } from './desk.ts';
import type { Faults } from './faults.ts';
import { bodyOf } from './webApi.ts';
import { bot } from './workspace.ts';

type Address = {
  readonly channel: string;
  readonly user: string;
  readonly threadTs: string | null;
  readonly bornMs: number;
  usesLeft: number;
};

/** Response addresses: five uses within half an hour, for the person and the channel they were made for. */
export type Responses = ReturnType<typeof makeResponses>;

const millisecondsPerMinute = 60_000;

export const makeResponses = (desk: Desk, faults: Faults) => {
  const addresses = new Map<string, Address>();

  const newAddress = (channel: string, user: string, threadTs: string | null): string => {
    const id = desk.newId('R');
    const bornMs = desk.workspace.clock.nowMs();
    addresses.set(id, { channel, user, threadTs, bornMs, usesLeft: limits.events.responseUrlUses });
    return `${desk.origin()}/respond/${id}`;
  };

  const spent = (address: Address): string | null => {
    const ageMs = desk.workspace.clock.nowMs() - address.bornMs;
    if (ageMs > limits.events.responseUrlMinutes * millisecondsPerMinute) return 'expired_url';
    return address.usesLeft <= 0 ? 'used_url' : null;
  };

  const take = (address: Address, body: string): void => {
    const args: Record<string, unknown> = JSON.parse(body);
    const deleteOriginal = args['delete_original'] === true;
    const { text, blocks } = deleteOriginal ? { text: '', blocks: [] } : contentOf(desk, args);
    const responseType = words(args, 'response_type') === 'in_channel' ? 'in_channel' : 'ephemeral';
    const channel = desk.workspace.channels.get(address.channel);
    if (responseType === 'in_channel' && channel !== undefined) {
      const { threadTs } = address;
      desk.workspace.say(channel, {
        user: bot.userId,
        botId: bot.botId,
        threadTs,
        fixed: true,
        text,
        blocks,
      });
    }
    desk.records.responses.add({
      channel: address.channel,
      user: address.user,
      responseType,
      text,
      blocks,
      replaceOriginal: args['replace_original'] === true,
      deleteOriginal,
    });
  };

  const answer = async (id: string, request: IncomingMessage, response: ServerResponse): Promise<void> => {
    const body = (await bodyOf(request)).toString();
    const address = addresses.get(id);
    const refusal = address === undefined ? 'no_service' : spent(address);
    if (address === undefined || refusal !== null) {
      response.writeHead(404).end(refusal);
      return;
    }
    const fault = faults.take('response_url');
    if (fault?.kind === 'status') {
      response.writeHead(fault.status).end();
      return;
    }
    address.usesLeft -= 1;
    try {
      take(address, body);
      response.end('ok');
    } catch (error) {
      if (!(error instanceof Refused)) throw error;
      response.writeHead(400).end(error.code);
    }
  };

  return { newAddress, answer };
};
