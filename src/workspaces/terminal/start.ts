import type { Reply } from '../../present/reply.ts';
import { toText } from '../../present/text.ts';
import { type AskedFrom, askedFromNowhere } from '../../terms/records.ts';
import type { Result } from '../../terms/result.ts';
import { said } from '../conversation.ts';
import type { Converse, Spoken } from '../converse.ts';
import type { Picture } from '../pictures.ts';
import { emptyRoom, type Line, promptOf, type Room, readLine } from './room.ts';

/** What the terminal workspace needs of the machine. */
export type Terminal = {
  /** The next typed line, after this prompt where a person is typing; null once the input is closed. */
  readonly nextLine: (prompt: string) => Promise<string | null>;
  readonly write: (text: string) => void;
  /** Writes what only helps the person along and is no part of the conversation. */
  readonly hint: (text: string) => void;
  readonly width: () => number;
  /** Writes a picture to a file; its path. */
  readonly savePicture: (picture: Picture) => Promise<Result<string>>;
  /** A person is typing: the welcome is shown, and what was typed is not repeated. */
  readonly interactive: boolean;
};

/** What stands beside the conversation in a terminal. */
export type Beside = {
  /** Tells this sitting from every other one, so that its threads are its own. */
  readonly sitting: string;
  readonly pinned: () => Promise<Reply>;
  /** The home page with this number, counted from 1. */
  readonly home: (page: number) => Promise<Reply>;
};

const welcome = [
  'This is a workspace of your own in the terminal. Type a question, such as',
  '  interval KELP 60d',
  'or help. Other words here: #name goes to a channel, @leadsman to direct messages, thread 1 into a thread,',
  'top out of it, press 1 presses a button, see says where the last picture is, home shows what is yours, pinned what',
  'is pinned, leave ends.',
].join('\n');

/** Asked one after the other where nobody types and nothing is piped in. */
export const demonstrationQuestions = ['interval KELP 60d', 'interval vol TARN 3m', 'feed'] as const;

const indented = (text: string): string =>
  text
    .split('\n')
    .map((line) => (line === '' ? '' : `  ${line}`))
    .join('\n');

/** Writes the pictures to files and says where each is. */
const showPictures = async (
  terminal: Terminal,
  pictures: Spoken['pictures'] = [],
): Promise<readonly string[]> => {
  const places: string[] = [];
  for (const picture of pictures) {
    const saved = await terminal.savePicture(picture);
    const place = saved.ok ? `Picture: ${saved.value}` : saved.problem.message;
    terminal.write(`${indented(place)}\n\n`);
    places.push(place);
  }
  return places;
};

const show = async (
  terminal: Terminal,
  room: Room,
  spoken: readonly Spoken[],
  thread: number,
): Promise<Room> => {
  let { buttons, pictures: places } = room;
  for (const { reply, pictures = [] } of spoken) {
    const passages = [...reply.passages, ...pictures.flatMap(({ inText }) => inText)];
    const options = { width: terminal.width() - 2, firstButton: buttons.length + 1 };
    terminal.write(`${indented(toText({ ...reply, passages }, options))}\n\n`);
    places = [...places, ...(await showPictures(terminal, pictures))];
    buttons = [...buttons, ...reply.buttons.map((button) => ({ ...button, thread }))];
  }
  return { ...room, buttons, pictures: places };
};

const placeOf = (room: Room) => (room.channel.startsWith('@') ? 'direct' : 'channel');

const say = (terminal: Terminal, text: string): void => terminal.write(`${text}\n`);

/** The one person at the terminal. */
export const atTerminal: AskedFrom = { ...askedFromNowhere, person: 'you' };

/** Where they are: messages are told apart by their number in this sitting. */
const fromOf = ({ channel }: Room, sitting: string, message: number, thread: number | null): AskedFrom => ({
  ...atTerminal,
  channel,
  message: `${sitting}:${message}`,
  thread: thread === null ? null : `${sitting}:${thread}`,
});

type Sitting = { readonly terminal: Terminal; readonly converse: Converse; readonly beside: Beside };

const ask = async ({ terminal, converse, beside }: Sitting, room: Room, text: string): Promise<Room> => {
  const number = room.messageCount + 1;
  const where = room.thread === null ? '' : `, in thread ${room.thread}`;
  if (terminal.interactive) terminal.hint(`  message ${number} in ${room.channel}${where}\n`);
  const from = fromOf(room, beside.sitting, number, room.thread);
  const spoken = await converse.ask({ text, place: placeOf(room), from });
  return show(terminal, { ...room, messageCount: number }, spoken, room.thread ?? number);
};

const press = async ({ terminal, converse, beside }: Sitting, room: Room, number: number): Promise<Room> => {
  const shown = room.buttons[number - 1];
  if (shown === undefined) {
    const count = room.buttons.length;
    say(
      terminal,
      count === 0 ? 'There is no button yet.' : `There is no button ${number}: press 1 to ${count}.`,
    );
    return room;
  }
  const { thread, ...button } = shown;
  const from = fromOf(room, beside.sitting, thread, thread);
  return show(terminal, room, await converse.press({ ...button, place: placeOf(room), from }), thread);
};

/** Says where a picture is, once more. */
const see = (terminal: Terminal, { pictures }: Room, number: number | null): void => {
  const count = pictures.length;
  const place = pictures[(number ?? count) - 1];
  if (place !== undefined) say(terminal, place);
  else if (count === 0) say(terminal, 'There is no picture yet. Ask for one: tail KELP as picture.');
  else say(terminal, `There is no picture ${number}: see 1 to ${count}.`);
};

const enterThread = (terminal: Terminal, room: Room, number: number | null): Room => {
  if (number === null || (number >= 1 && number <= room.messageCount)) return { ...room, thread: number };
  const count = room.messageCount;
  say(
    terminal,
    count === 0
      ? 'There is no message yet.'
      : `There is no message ${number}: 1 to ${count} can be answered.`,
  );
  return room;
};

/** Does what one line asks. */
const follow = async (sitting: Sitting, room: Room, line: Line): Promise<Room> => {
  const { terminal, beside } = sitting;
  switch (line.kind) {
    case 'channel':
      return { ...room, channel: line.name, thread: null };
    case 'thread':
      return enterThread(terminal, room, line.number);
    case 'press':
      return press(sitting, room, line.number);
    case 'pinned':
      return show(terminal, room, [said(await beside.pinned())], room.messageCount);
    case 'home':
      return show(terminal, room, [said(await beside.home(line.page))], room.messageCount);
    case 'message':
      return ask(sitting, room, line.text);
    case 'see':
      see(terminal, room, line.number);
      return room;
    default:
      return room;
  }
};

/** Runs the terminal workspace until the input closes or the person leaves. Resolves to the number of messages answered. */
export const startTerminal = async (
  terminal: Terminal,
  converse: Converse,
  beside: Beside,
): Promise<number> => {
  const sitting = { terminal, converse, beside };
  let room = emptyRoom;
  let linesRead = 0;
  /** Where nobody types, what was read is shown, so that the whole can be read as a conversation. */
  const echo = (typed: string) => {
    if (!terminal.interactive && typed.trim() !== '') terminal.hint(`${promptOf(room)}${typed.trim()}\n`);
  };
  if (terminal.interactive) terminal.hint(`${welcome}\n`);
  for (;;) {
    const typed = await terminal.nextLine(promptOf(room));
    if (typed === null) break;
    linesRead += 1;
    echo(typed);
    const line = readLine(typed);
    if (line.kind === 'leave') return room.messageCount;
    room = await follow(sitting, room, line);
  }
  if (linesRead === 0 && !terminal.interactive)
    for (const question of demonstrationQuestions) {
      echo(question);
      room = await ask(sitting, room, question);
    }
  return room.messageCount;
};
