import { blocksFaults } from './internal/blocks.ts';
import { isPart, kindOf, lengthFaults, neededFaults, partsOf, plainFaults } from './internal/part.ts';
import { platformLimits } from './platformLimits.ts';

const limits = platformLimits.view;

/** UTF-8 bytes of a text, without a machine’s own encoder. */
const bytesOf = (text: string): number => {
  let bytes = 0;
  for (const character of text) {
    const point = character.codePointAt(0) ?? 0;
    bytes += point < 0x80 ? 1 : point < 0x800 ? 2 : point < 0x10000 ? 3 : 4;
  }
  return bytes;
};

/** How a form or a home page breaks the limits of the platform, a sentence each; empty where it keeps them all. */
export const viewFaults = (view: unknown): readonly string[] => {
  if (!isPart(view)) return ['the view is none'];
  const blocks = partsOf(view['blocks']);
  const bytes = bytesOf(JSON.stringify(view));
  const isForm = kindOf(view) === 'modal';
  return [
    ...(isForm ? neededFaults('title', view['title'], limits.title) : []),
    ...plainFaults('title', view['title']),
    ...lengthFaults('submit label', view['submit'], limits.submitLabel),
    ...lengthFaults('close label', view['close'], limits.closeLabel),
    ...lengthFaults('private metadata', view['private_metadata'], limits.privateMetadata),
    ...lengthFaults('callback id', view['callback_id'], limits.callbackId),
    ...(blocks.some((block) => kindOf(block) === 'table') ? ['a table cannot stand in a view'] : []),
    ...(bytes > limits.bytes ? [`the view has ${bytes} bytes, ${limits.bytes} at most`] : []),
    ...blocksFaults(blocks, limits.blocks),
  ];
};
