import { limitFaults } from '../../../src/present/limits/limitFaults.ts';
import limits from '../../fixtures/platform/limits.json' with { type: 'json' };
import { Refused, words } from './arguments.ts';
import { blockProblems, filesShown } from './blocks.ts';
import type { Desk } from './desk.ts';
import type { Arguments } from './records.ts';
import type { Block, Metadata } from './workspace.ts';

const isBlock = (value: unknown): value is Block =>
  typeof value === 'object' && value !== null && 'type' in value && typeof value.type === 'string';

const refuseBlocks = (problems: readonly string[]): never => {
  throw new Refused(
    'invalid_blocks',
    problems.map((problem) => `[ERROR] ${problem}`),
  );
};

const checkFiles = (desk: Desk, blocks: unknown): void => {
  for (const id of filesShown(blocks)) {
    const file = desk.files.get(id);
    if (file === undefined || !file.completed) refuseBlocks(['invalid slack file']);
    else if (file.refusalsLeft > 0) {
      file.refusalsLeft -= 1;
      refuseBlocks(['invalid slack file']);
    }
  }
};

export type Content = { readonly text: string; readonly blocks: readonly Block[] };

/** Text and blocks of a message, or the platform's refusal of them. */
export const contentOf = (desk: Desk, args: Arguments): Content => {
  const text = words(args, 'text') ?? '';
  const blocks = args['blocks'] ?? [];
  if (!Array.isArray(blocks) || !blocks.every(isBlock)) throw new Refused('invalid_blocks_format');
  desk.records.limitFaults.push(...limitFaults({ text, blocks }));
  const problems = blockProblems(blocks, 'message');
  if (problems.length > 0) refuseBlocks(problems);
  checkFiles(desk, blocks);
  if (text === '' && blocks.length === 0) throw new Refused('no_text');
  if (text.length > limits.message.textHard) throw new Refused('msg_too_long');
  return { text, blocks };
};

export const metadataOf = (args: Arguments): Metadata | null => {
  const given = args['metadata'];
  if (given === undefined) return null;
  if (typeof given !== 'object' || given === null) throw new Refused('invalid_metadata_format');
  if (Object.keys(given).length === 0) return null;
  if (!('event_type' in given) || typeof given.event_type !== 'string' || !/^\w+$/.test(given.event_type))
    throw new Refused('invalid_metadata_format');
  if (
    !('event_payload' in given) ||
    typeof given.event_payload !== 'object' ||
    given.event_payload === null ||
    Array.isArray(given.event_payload)
  )
    throw new Refused('invalid_metadata_format');
  return { event_type: given.event_type, event_payload: { ...given.event_payload } };
};
