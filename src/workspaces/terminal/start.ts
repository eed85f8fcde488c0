import type { Reply } from '../../present/reply.ts';
import { toText } from '../../present/text.ts';
import type { Result } from '../../terms/result.ts';
import { said } from '../conversation.ts';
import type { Converse, Spoken } from '../converse.ts';
import type { Picture } from '../pictures.ts';
import { emptyRoom, promptOf, type Room, readLine } from './room.ts';

/** What the terminal workspace needs of the machine. */
export type Terminal = {
  /** The next typed line, after this prompt where a person is typing; null once the input is closed. */
  readonly nextLine: (prompt: string) => Promise<string | null>;
  readonly write: (text: string) => void;
  readonly width: () => number;
  /** Writes a picture to a file; its path. */
  readonly savePicture: (picture: Picture) => Promise<Result<string>>;
  /** A person is typing: the welcome is shown, and what was typed is not repeated. */
  readonly interactive: boolean;
};

const welcome = [
  'This is a workspace of your own in the terminal. Type a question, such as',
  '  interval KELP 60d',
  'or help. Other words here: #name goes to a channel, @leadsman to direct messages, thread 1 into a thread,',
  'top out of it, press 1 presses a button, pinned shows what is pinned, leave ends.',
].join('\n');

/** Asked one after the other where nobody types and nothing is piped in. */
export const demonstrationQuestions = ['interval KELP 60d', 'interval vol TARN 3m', 'feed'] as const;

const indented = (text: string): string =>
  text
    .split('\n')
    .map((line) => (line === '' ? '' : `  ${line}`))
    .join('\n');

const showPictures = async (terminal: Terminal, pictures: Spoken['pictures'] = []): Promise<void> => {
  for (const picture of pictures) {
    const saved = await terminal.savePicture(picture);
    const where = saved.ok ? `Picture: ${saved.value}` : saved.problem.message;
    terminal.write(`${indented(where)}\n\n`);
  }
};

const show = async (terminal: Terminal, room: Room, spoken: readonly Spoken[]): Promise<Room> => {
  let { buttons } = room;
  for (const { reply, pictures = [] } of spoken) {
    const passages = [...reply.passages, ...pictures.flatMap(({ inText }) => inText)];
    const options = { width: terminal.width() - 2, firstButton: buttons.length + 1 };
    terminal.write(`${indented(toText({ ...reply, passages }, options))}\n\n`);
    await showPictures(terminal, pictures);
    buttons = [...buttons, ...reply.buttons];
  }
  return { ...room, buttons };
};

const placeOf = (room: Room) => (room.channel.startsWith('@') ? 'direct' : 'channel');

const say = (terminal: Terminal, text: string): void => terminal.write(`${text}\n`);

const ask = async (terminal: Terminal, converse: Converse, room: Room, text: string): Promise<Room> => {
  const number = room.messageCount + 1;
  const where = room.thread === null ? '' : `, in thread ${room.thread}`;
  if (terminal.interactive) say(terminal, `  message ${number} in ${room.channel}${where}`);
  const spoken = await converse.ask({ text, place: placeOf(room) });
  return show(terminal, { ...room, messageCount: number }, spoken);
};

const press = async (terminal: Terminal, converse: Converse, room: Room, number: number): Promise<Room> => {
  const button = room.buttons[number - 1];
  if (button === undefined) {
    const count = room.buttons.length;
    say(
      terminal,
      count === 0 ? 'There is no button yet.' : `There is no button ${number}: press 1 to ${count}.`,
    );
    return room;
  }
  const spoken = await converse.press({ ...button, place: placeOf(room) });
  return show(terminal, room, spoken);
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

/** Runs the terminal workspace until the input closes or the person leaves. Resolves to the number of messages answered. */
export const startTerminal = async (
  terminal: Terminal,
  converse: Converse,
  pinned: () => Promise<Reply>,
): Promise<number> => {
  let room = emptyRoom;
  let linesRead = 0;
  /** Where nobody types, what was read is shown, so that the whole can be read as a conversation. */
  const echo = (typed: string) => {
    if (!terminal.interactive && typed.trim() !== '') say(terminal, `${promptOf(room)}${typed.trim()}`);
  };
  if (terminal.interactive) say(terminal, welcome);
  for (;;) {
    const typed = await terminal.nextLine(promptOf(room));
    if (typed === null) break;
    linesRead += 1;
    echo(typed);
    const line = readLine(typed);
    if (line.kind === 'leave') return room.messageCount;
    if (line.kind === 'channel') room = { ...room, channel: line.name, thread: null };
    else if (line.kind === 'thread') room = enterThread(terminal, room, line.number);
    else if (line.kind === 'press') room = await press(terminal, converse, room, line.number);
    else if (line.kind === 'pinned') room = await show(terminal, room, [said(await pinned())]);
    else if (line.kind === 'message') room = await ask(terminal, converse, room, line.text);
  }
  if (linesRead === 0 && !terminal.interactive)
    for (const question of demonstrationQuestions) {
      echo(question);
      room = await ask(terminal, converse, room, question);
    }
  return room.messageCount;
};
