import { z } from 'zod';
import limits from '../../fixtures/platform/limits.json' with { type: 'json' };
import { tableBlock, tableProblems } from './table.ts';

const upTo = (characters: number) => z.string().min(1).max(characters);
const plain = (characters: number) =>
  z.strictObject({ type: z.literal('plain_text'), text: upTo(characters), emoji: z.boolean().optional() });
const marked = (characters: number) =>
  z.strictObject({ type: z.literal('mrkdwn'), text: upTo(characters), verbatim: z.boolean().optional() });
const eitherText = (characters: number) => z.union([plain(characters), marked(characters)]);

const blockId = { block_id: upTo(limits.ids.blockId).optional() };
const actionId = { action_id: upTo(limits.ids.actionId).optional() };

const confirm = z.strictObject({
  title: plain(limits.confirm.title),
  text: eitherText(limits.confirm.text),
  confirm: plain(limits.confirm.button),
  deny: plain(limits.confirm.button),
  style: z.enum(['primary', 'danger']).optional(),
});
const option = z.strictObject({
  text: eitherText(limits.select.optionText),
  value: upTo(limits.select.optionValue),
  description: plain(limits.select.optionText).optional(),
});
const placeholder = plain(limits.select.placeholder).optional();

const button = z.strictObject({
  type: z.literal('button'),
  text: plain(limits.button.text),
  value: z.string().max(limits.button.value).optional(),
  url: z.string().max(limits.button.url).optional(),
  style: z.enum(['primary', 'danger']).optional(),
  confirm: confirm.optional(),
  accessibility_label: z.string().max(limits.button.accessibilityLabel).optional(),
  ...actionId,
});
const overflow = z.strictObject({
  type: z.literal('overflow'),
  options: z.array(option).min(1).max(limits.overflow.options),
  confirm: confirm.optional(),
  ...actionId,
});
const staticSelect = z.strictObject({
  type: z.literal('static_select'),
  options: z.array(option).min(1).max(limits.select.options),
  initial_option: option.optional(),
  placeholder,
  confirm: confirm.optional(),
  ...actionId,
});
const externalSelect = z.strictObject({
  type: z.literal('external_select'),
  min_query_length: z.number().int().optional(),
  placeholder,
  ...actionId,
});
const conversationsSelect = z.strictObject({
  type: z.literal('conversations_select'),
  default_to_current_conversation: z.boolean().optional(),
  response_url_enabled: z.boolean().optional(),
  filter: z
    .strictObject({
      include: z
        .array(z.enum(['im', 'mpim', 'private', 'public']))
        .min(1)
        .optional(),
      exclude_bot_users: z.boolean().optional(),
      exclude_external_shared_channels: z.boolean().optional(),
    })
    .optional(),
  placeholder,
  ...actionId,
});
const checkboxes = z.strictObject({
  type: z.literal('checkboxes'),
  options: z.array(option).min(1).max(limits.checkboxes.options),
  initial_options: z.array(option).optional(),
  ...actionId,
});
const textInput = z.strictObject({
  type: z.literal('plain_text_input'),
  multiline: z.boolean().optional(),
  initial_value: z.string().optional(),
  max_length: z.number().int().max(limits.input.maxLength).optional(),
  dispatch_action_config: z
    .strictObject({
      trigger_actions_on: z.array(z.enum(['on_enter_pressed', 'on_character_entered'])).min(1),
    })
    .optional(),
  placeholder,
  ...actionId,
});
const picture = {
  type: z.literal('image'),
  alt_text: upTo(limits.image.altText),
  image_url: z.string().max(limits.image.url).optional(),
  slack_file: z.union([z.strictObject({ id: z.string() }), z.strictObject({ url: z.string() })]).optional(),
};
const pointing = [button, overflow, staticSelect, externalSelect, conversationsSelect, checkboxes] as const;

const block = z.discriminatedUnion('type', [
  z.strictObject({
    type: z.literal('section'),
    text: eitherText(limits.section.text).optional(),
    fields: z.array(eitherText(limits.section.fieldText)).min(1).max(limits.section.fields).optional(),
    accessory: z.union([...pointing, z.strictObject(picture)]).optional(),
    expand: z.boolean().optional(),
    ...blockId,
  }),
  z.strictObject({ type: z.literal('header'), text: plain(limits.header.text), ...blockId }),
  z.strictObject({ type: z.literal('divider'), ...blockId }),
  z.strictObject({
    type: z.literal('context'),
    elements: z
      .array(z.union([plain(limits.section.text), marked(limits.section.text), z.strictObject(picture)]))
      .min(1)
      .max(limits.context.elements),
    ...blockId,
  }),
  z.strictObject({
    type: z.literal('actions'),
    elements: z
      .array(z.union([...pointing]))
      .min(1)
      .max(limits.actions.elements),
    ...blockId,
  }),
  z.strictObject({ ...picture, title: plain(limits.image.title).optional(), ...blockId }),
  z.strictObject({
    type: z.literal('input'),
    label: plain(limits.input.label),
    hint: plain(limits.input.hint).optional(),
    element: z.union([textInput, staticSelect, externalSelect, conversationsSelect, checkboxes]),
    optional: z.boolean().optional(),
    dispatch_action: z.boolean().optional(),
    ...blockId,
  }),
  z.strictObject({ type: z.literal('markdown'), text: upTo(limits.markdown.textAllBlocks), ...blockId }),
  z.looseObject({ type: z.literal('rich_text'), elements: z.array(z.looseObject({ type: z.string() })) }),
  tableBlock,
]);

export type CheckedBlock = z.infer<typeof block>;

const repeated = (names: readonly (string | undefined)[]): boolean => {
  const given = names.filter((name) => name !== undefined);
  return new Set(given).size < given.length;
};

const contentProblems = (blocks: readonly CheckedBlock[]): string[] =>
  blocks.flatMap((checked, index) => {
    if (checked.type === 'section' && checked.text === undefined && checked.fields === undefined)
      return [`section needs text or fields [json-pointer:/blocks/${index}]`];
    if (checked.type === 'image' && checked.image_url === undefined && checked.slack_file === undefined)
      return [`image needs image_url or slack_file [json-pointer:/blocks/${index}]`];
    if (checked.type === 'actions' && repeated(checked.elements.map((element) => element.action_id)))
      return [`action_id already exists [json-pointer:/blocks/${index}]`];
    return [];
  });

const identifierOf = (checked: CheckedBlock): string | undefined =>
  'block_id' in checked && typeof checked.block_id === 'string' ? checked.block_id : undefined;

/** Why the platform would refuse these blocks, in its form; empty where it takes them. */
export const blockProblems = (blocks: unknown, place: 'message' | 'view'): readonly string[] => {
  const most = place === 'message' ? limits.message.blocks : limits.view.blocks;
  const read = z.array(block).max(most).safeParse(blocks);
  if (!read.success) {
    return read.error.issues.map(
      (issue) => `${issue.message} [json-pointer:/blocks/${issue.path.join('/')}]`,
    );
  }
  const problems = [...contentProblems(read.data), ...tableProblems(read.data, place)];
  if (repeated(read.data.map(identifierOf))) problems.push('block_id already exists');
  return problems;
};

/** The files that the blocks show, by their id. */
export const filesShown = (blocks: unknown): readonly string[] => {
  const read = z.array(block).safeParse(blocks);
  if (!read.success) return [];
  return read.data.flatMap((shown) =>
    shown.type === 'image' && shown.slack_file !== undefined && 'id' in shown.slack_file
      ? [shown.slack_file.id]
      : [],
  );
};
