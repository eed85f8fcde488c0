import { clipped, cutLines, firstLines, gathered, restInWords } from './limits/cut.ts';
import { platformLimits as limits } from './limits/platformLimits.ts';
import type { Button, Passage, Reply, Table } from './reply.ts';
import { furtherWarnings, partsInWords, shownWarnings } from './words.ts';

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

/** Room for the parts of a reply that are short by nature, so that table and passages have the rest of the message. */
const room = { sentence: limits.section.text, warning: 1200, quietLine: 1500, caution: 600 };

/** The parts around the passages take at most ten of a message's blocks. */
const mostPassages = limits.message.blocks - 10;

/** Kept free for the lines that say how much is left out, and for one that a workspace puts above the message. */
const noteRoom = 400;

/** The same for the text of notifications. */
const textRoom = limits.message.textAdvised - noteRoom;

const emptyCell = '–';
const zeroWidthJoiner = '\u200d';

export const plain = (text: string, most: number): PlainText => ({
  type: 'plain_text',
  text: clipped(text === '' ? emptyCell : text, most),
  emoji: false,
});

const section = (text: string, most: number = limits.section.text): Block => ({
  type: 'section',
  text: plain(text, most),
});

const context = (texts: readonly string[], most: number): Block => ({
  type: 'context',
  elements: texts.map((text) => plain(text, most)),
});

type Row = readonly { readonly type: 'raw_text'; readonly text: string }[];

const row = (texts: readonly string[]): Row =>
  texts.map((text) => ({ type: 'raw_text', text: text === '' ? emptyCell : text }));

const lengthOf = (cells: Row): number => cells.reduce((sum, { text }) => sum + text.length, 0);

/** The table with as many of its rows as have room, and how many have none. */
const tableParts = (
  table: Table,
  most: number,
): { readonly blocks: readonly Block[]; readonly restCount: number } => {
  const columns = table.columns.slice(0, limits.table.columns);
  const all = [
    row(columns.map(({ head }) => head)),
    ...table.rows.map((cells) => row(columns.map((_, index) => cells[index] ?? ''))),
  ];
  const shown: Row[] = [];
  let used = 0;
  for (const cells of all.slice(0, limits.table.rows)) {
    used += lengthOf(cells);
    if (used > most) break;
    shown.push(cells);
  }
  const column_settings = columns.map(({ align }) => ({ align, is_wrapped: true }));
  const restCount = table.rows.length - Math.max(0, shown.length - 1);
  return { blocks: shown.length === 0 ? [] : [{ type: 'table', rows: shown, column_settings }], restCount };
};

/** Passages as sections, cut after the last whole line that has room. */
const passageBlocks = (passages: readonly Passage[], most: number, reply: Reply): readonly Block[] => {
  const lines = passages.flatMap(({ head, lines: own }, index) =>
    [...(head === null ? [] : [head]), ...own].map((line) => ({
      line,
      at: Math.min(index, mostPassages - 1),
    })),
  );
  const { shown, restCount } = firstLines(
    lines.map(({ line }) => line),
    most,
  );
  const kept = lines.slice(0, shown.length);
  const texts = [...new Set(kept.map(({ at }) => at))].flatMap((at) =>
    gathered(
      kept.filter((each) => each.at === at).map(({ line }) => line),
      limits.section.text,
    ),
  );
  return [...texts, ...(restCount > 0 ? [restInWords(restCount, 'line', reply)] : [])].map((text) =>
    section(text),
  );
};

/** What a button carries. A question that is too long to stand there is left to the record. */
const buttonValue = ({ answerId: id, question, added }: Button): string => {
  const more = added === undefined ? {} : { added };
  const whole = JSON.stringify({ id, question, ...more });
  return whole.length <= limits.button.value ? whole : JSON.stringify({ id, ...more });
};

const buttonElement = (button: Button, actionId: string) => ({
  type: 'button' as const,
  action_id: actionId,
  text: plain(button.label, limits.button.text),
  value: buttonValue(button),
  accessibility_label: clipped(`${button.label} of ${button.answerId}`, limits.button.accessibilityLabel),
});

/** Several buttons of one kind are told apart by what follows a full stop in their action id. */
const buttonElements = (buttons: readonly Button[]) =>
  buttons.slice(0, limits.actions.elements).map((button, index) => {
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

/** All that notifications and screen readers get: where there is no room for everything, what is told at length is cut. */
const fallbackText = (reply: Reply): string => {
  const { head, body, foot } = partsInWords(reply);
  const escaped = (lines: readonly string[]) => lines.map(escapeFallback);
  const ends = [...escaped(head), ...escaped(foot)].join('\n').length;
  const middle = cutLines(escaped(body), textRoom - ends - 2, (count) =>
    escapeFallback(restInWords(count, 'line', reply)),
  );
  return clipped([...escaped(head), ...middle, ...escaped(foot)].join('\n'), textRoom);
};

const footBlocks = (reply: Reply): readonly Block[] => {
  const further = furtherWarnings(reply);
  const warnings = shownWarnings(reply).map((warning) => `Caution: ${warning}`);
  return [
    ...(warnings.length > 0
      ? [context(further === null ? warnings : [...warnings, further], room.warning)]
      : []),
    ...(reply.quietLine === null ? [] : [context([reply.quietLine], room.quietLine)]),
    ...(reply.caution === null ? [] : [context([reply.caution], room.caution)]),
    ...(reply.buttons.length > 0
      ? [{ type: 'actions' as const, elements: buttonElements(reply.buttons) }]
      : []),
  ];
};

const charactersOf = (blocks: readonly Block[]): number =>
  blocks
    .map((block) => {
      if (block.type === 'section') return block.text.text.length;
      if (block.type === 'table') return block.rows.reduce((sum, cells) => sum + lengthOf(cells), 0);
      return block.elements.reduce(
        (sum, element) => sum + (element.type === 'button' ? element.text.text : element.text).length,
        0,
      );
    })
    .reduce((sum, each) => sum + each, 0);

/** The reply as a message of the workspace: blocks for the eye, and one text for notifications and screen readers. */
export const toBlocks = (reply: Reply): BlockMessage => {
  const sentence = section(reply.sentence, room.sentence);
  const foot = footBlocks(reply);
  const most = limits.message.blocksTotalCharactersAdvised - noteRoom - charactersOf([sentence, ...foot]);
  const table =
    reply.table === null
      ? { blocks: [], restCount: 0 }
      : tableParts(reply.table, Math.min(most, limits.table.charactersAllCells));
  const rowsLeft = table.restCount > 0 ? [section(restInWords(table.restCount, 'row', reply))] : [];
  const passages = passageBlocks(reply.passages, most - charactersOf(table.blocks), reply);
  return {
    text: fallbackText(reply),
    blocks: [sentence, ...table.blocks, ...rowsLeft, ...passages, ...foot],
  };
};
