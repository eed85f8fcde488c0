import { needed, Refused } from '../arguments.ts';
import { type Desk, type Method, type Methods, openChannel } from '../desk.ts';
import type { Arguments } from '../records.ts';
import { writtenOut } from '../workspace.ts';

const pinnable = (desk: Desk, args: Arguments) => {
  const channel = openChannel(desk, needed(args, 'channel'));
  const message = desk.workspace.messageAt(channel.id, needed(args, 'timestamp'));
  if (message === null) throw new Refused('message_not_found');
  return { channel, message };
};

const add: Method = (desk, args) => {
  const { channel, message } = pinnable(desk, args);
  if (message.fixed) throw new Refused('not_pinnable');
  if (channel.pins.includes(message.ts)) throw new Refused('already_pinned');
  channel.pins.push(message.ts);
  desk.records.pins.add({ channel: channel.id, ts: message.ts, pinned: true });
  return {};
};

const remove: Method = (desk, args) => {
  const { channel, message } = pinnable(desk, args);
  if (!channel.pins.includes(message.ts)) throw new Refused('no_pin');
  channel.pins.splice(channel.pins.indexOf(message.ts), 1);
  desk.records.pins.add({ channel: channel.id, ts: message.ts, pinned: false });
  return {};
};

const list: Method = (desk, args) => {
  const channel = openChannel(desk, needed(args, 'channel'));
  const items = channel.pins.flatMap((ts) => {
    const message = desk.workspace.messageAt(channel.id, ts);
    return message === null
      ? []
      : [{ type: 'message', channel: channel.id, message: writtenOut(message, false) }];
  });
  return { items };
};

export const pins: Methods = { 'pins.add': add, 'pins.remove': remove, 'pins.list': list };
