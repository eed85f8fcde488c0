import type { Button, Passage, Reply, Table } from './reply.ts';
import { furtherWarnings, inWords, shownWarnings } from './words.ts';

/** The platform's plain text object: nothing in it is ever read as markup, a link, a mention or an emoji. */
export type PlainText = { readonly type: 'plain_text'; readonly text: string; readonly emoji: false };

export type Block =
  | { readonly type: 'section'; readonly text: PlainText }
  | { readonly type: 'context'; readonly elements: readonly PlainText[] }
  | {
      readonly type: 'table';
      readonly rows: readonly (readonly { readonly type: 'raw_text'; readonly text: string }[])[];
      readonly column_settings: readonly { readonly align: 'left' | 'right'; readonly is_wrapped: boolean }[];
    }
  | {
      readonly type: 'actions';
      readonly elements: readonly {
        readonly type: 'button';
        readonly action_id: string;
        readonly text: PlainText;
        readonly value: string;
        readonly accessibility_label: string;
      }[];
    };

export type BlockMessage = { readonly text: string; readonly blocks: readonly Block[] };

/** The platform's figures for a message, from its published block reference. */
const longest = {
  sectionText: 3000,
  contextText: 2000,
  fallbackText: 4000,
  buttonText: 75,
  buttonValue: 2000,
};

/** A message holds 50 blocks; the parts around the passages take at most ten. */
const mostPassageBlocks = 40;

const emptyCell = '–';
const zeroWidthJoiner = '\u200d';

/** Cut at a word, with an ellipsis, so that the platform takes it. */
const clipped = (text: string, room: number): string =>
  text.length <= room ? text : `${text.slice(0, room - 1).replace(/\s+\S*$/, '')}…`;

const plain = (text: string, room: number): PlainText => ({
  type: 'plain_text',
  text: clipped(text === '' ? emptyCell : text, room),
  emoji: false,
});

const section = (text: string): Block => ({ type: 'section', text: plain(text, longest.sectionText) });

const context = (texts: readonly string[]): Block => ({
  type: 'context',
  elements: texts.map((text) => plain(text, longest.contextText)),
});

/** Lines gathered into as few texts as the room of a section allows. */
const gathered = (lines: readonly string[]): readonly string[] => {
  const texts: string[] = [];
  for (const line of lines) {
    const last = texts.at(-1);
    if (last !== undefined && last.length + 1 + line.length <= longest.sectionText)
      texts[texts.length - 1] = `${last}\n${line}`;
    else texts.push(line);
  }
  return texts;
};

const passageBlocks = ({ head, lines }: Passage): readonly Block[] =>
  gathered([...(head === null ? [] : [head]), ...lines]).map(section);

const cell = (text: string) => ({ type: 'raw_text' as const, text: text === '' ? emptyCell : text });

const tableBlock = ({ columns, rows }: Table): Block => ({
  type: 'table',
  rows: [
    columns.map(({ head }) => cell(head)),
    ...rows.map((row) => columns.map((_, index) => cell(row[index] ?? ''))),
  ],
  column_settings: columns.map(({ align }) => ({ align, is_wrapped: true })),
});

const buttonElement = ({ label, answerId, question, added }: Button, actionId: string) => ({
  type: 'button' as const,
  action_id: actionId,
  text: plain(label, longest.buttonText),
  value: JSON.stringify({ id: answerId, question, ...(added === undefined ? {} : { added }) }),
  accessibility_label: clipped(`${label} of ${answerId}`, longest.buttonText),
});

/** Several buttons of one kind are told apart by what follows a full stop in their action id. */
const buttonElements = (buttons: readonly Button[]) =>
  buttons.map((button, index) => {
    const before = buttons.slice(0, index).filter(({ action }) => action === button.action).length;
    return buttonElement(button, before === 0 ? button.action : `${button.action}.${before + 1}`);
  });

/** The top-level text is read as markup by the platform, so whatever could be markup in it is made harmless. */
export const escapeFallback = (text: string): string =>
  text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/[@#]/g, (mark) => `${mark}${zeroWidthJoiner}`)
    .replace(/:\/\//g, `:${zeroWidthJoiner}//`);

/** The reply as a message of the workspace: blocks for the eye, and one text for notifications and screen readers. */
export const toBlocks = (reply: Reply): BlockMessage => {
  const further = furtherWarnings(reply);
  const blocks: Block[] = [section(reply.sentence)];
  if (reply.table !== null) blocks.push(tableBlock(reply.table));
  blocks.push(...reply.passages.flatMap(passageBlocks).slice(0, mostPassageBlocks));
  const warnings = shownWarnings(reply).map((warning) => `Caution: ${warning}`);
  if (warnings.length > 0) blocks.push(context(further === null ? warnings : [...warnings, further]));
  if (reply.quietLine !== null) blocks.push(context([reply.quietLine]));
  if (reply.caution !== null) blocks.push(context([reply.caution]));
  if (reply.buttons.length > 0) blocks.push({ type: 'actions', elements: buttonElements(reply.buttons) });
  return { text: clipped(escapeFallback(inWords(reply)), longest.fallbackText), blocks };
};
