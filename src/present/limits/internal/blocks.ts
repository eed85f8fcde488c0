import { platformLimits as limits } from '../platformLimits.ts';
import { elementFaults, pictureFaults } from './elements.ts';
import {
  countFaults,
  isPart,
  kindOf,
  lengthFaults,
  neededFaults,
  type Part,
  partsOf,
  plainFaults,
} from './part.ts';
import { tableFaults } from './table.ts';

type Check = (block: Part, where: string) => readonly string[];

const elementsFaults = (block: Part, where: string, most: number): readonly string[] => [
  ...countFaults(`${where} elements`, block['elements'], most),
  ...partsOf(block['elements']).flatMap((element, index) =>
    elementFaults(element, `${where} element ${index + 1}`),
  ),
];

const repeatedActions: Check = (block, where) => {
  const ids = partsOf(block['elements']).flatMap((element) => element['action_id'] ?? []);
  return new Set(ids).size < ids.length ? [`${where} repeats an action id`] : [];
};

const section: Check = (block, where) => {
  const { text, fields, accessory } = block;
  return [
    ...(text === undefined && fields === undefined ? [`${where} says nothing`] : []),
    ...lengthFaults(`${where} text`, text, limits.section.text),
    ...(fields === undefined ? [] : countFaults(`${where} fields`, fields, limits.section.fields)),
    ...partsOf(fields).flatMap((field, index) =>
      lengthFaults(`${where} field ${index + 1}`, field, limits.section.fieldText),
    ),
    ...(isPart(accessory) ? elementFaults(accessory, `${where} accessory`) : []),
  ];
};

const input: Check = (block, where) => {
  const { element, label, hint } = block;
  return [
    ...neededFaults(`${where} label`, label, limits.input.label),
    ...lengthFaults(`${where} hint`, hint, limits.input.hint),
    ...(isPart(element) ? elementFaults(element, `${where} element`) : [`${where} has no element`]),
  ];
};

const byKind: Readonly<Record<string, Check>> = {
  section,
  input,
  header: (block, where) => [
    ...neededFaults(`${where} text`, block['text'], limits.header.text),
    ...plainFaults(`${where} text`, block['text']),
  ],
  context: (block, where) => elementsFaults(block, where, limits.context.elements),
  actions: (block, where) => [
    ...elementsFaults(block, where, limits.actions.elements),
    ...repeatedActions(block, where),
  ],
  divider: () => [],
  image: pictureFaults,
  markdown: (block, where) => neededFaults(`${where} text`, block['text'], limits.markdown.textAllBlocks),
  rich_text: () => [],
  table: tableFaults,
};

const ofOneBlock = (block: Part, where: string): readonly string[] => {
  const check = byKind[kindOf(block)];
  return [
    ...(check === undefined ? [`${where} is of a kind that is not known`] : check(block, where)),
    ...lengthFaults(`${where} block id`, block['block_id'], limits.ids.blockId),
  ];
};

const repeatedBlocks = (blocks: readonly Part[]): readonly string[] => {
  const ids = blocks.flatMap((block) => block['block_id'] ?? []);
  return new Set(ids).size < ids.length ? ['a block id stands twice'] : [];
};

const markdownFaults = (blocks: readonly Part[]): readonly string[] => {
  const characters = blocks
    .filter((block) => kindOf(block) === 'markdown')
    .reduce((sum, block) => sum + String(block['text'] ?? '').length, 0);
  return characters > limits.markdown.textAllBlocks ? [`markdown blocks have ${characters} characters`] : [];
};

/** What is wrong with the blocks of a message or a view, at most so many of them. */
export const blocksFaults = (blocks: readonly Part[], most: number): readonly string[] => [
  ...(blocks.length > most ? [`${blocks.length} blocks, ${most} at most`] : []),
  ...blocks.flatMap((block, index) => ofOneBlock(block, `block ${index + 1} (${kindOf(block)})`)),
  ...repeatedBlocks(blocks),
  ...markdownFaults(blocks),
];
