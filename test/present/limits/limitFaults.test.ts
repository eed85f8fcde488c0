import { describe, expect, test } from 'vitest';
import { limitFaults } from '../../../src/present/limits/limitFaults.ts';
import { viewFaults } from '../../../src/present/limits/viewFaults.ts';

const plain = (text: string) => ({ type: 'plain_text', text, emoji: false });
const long = (characters: number) => 'x'.repeat(characters);
const section = (text: string, more: object = {}) => ({ type: 'section', text: plain(text), ...more });
const button = (more: object = {}) => ({
  type: 'button',
  action_id: 'working',
  text: plain('Show the working'),
  value: '{}',
  ...more,
});
const actions = (...elements: readonly object[]) => ({ type: 'actions', elements });
const cell = (text: string) => ({ type: 'raw_text', text });
const table = (...rows: readonly (readonly object[])[]) => ({ type: 'table', rows });
const options = (count: number) =>
  Array.from({ length: count }, (_, index) => ({ text: plain(`Option ${index}`), value: `v${index}` }));
const message = (...blocks: readonly unknown[]) => ({ text: 'so', blocks });
const input = (element: object) => ({ type: 'input', label: plain('Window'), element });

describe('a message that keeps the limits', () => {
  test.each([
    ['text alone', { text: 'so', blocks: [] }],
    ['fifty blocks', message(...Array.from({ length: 50 }, () => section('a')))],
    ['a section of 3000', message(section(long(3000)))],
    ['a header of 150', message({ type: 'header', text: plain(long(150)) })],
    ['ten context elements', message({ type: 'context', elements: Array(10).fill(plain('a')) })],
    ['a button at its limits', message(actions(button({ text: plain(long(75)), value: long(2000) })))],
    ['a table of 100 rows', message(table(...Array.from({ length: 100 }, () => [cell('a')])))],
    ['a table of 20 columns', message(table(Array.from({ length: 20 }, () => cell('a'))))],
    [
      'a picture',
      message({ type: 'image', slack_file: { id: 'F1' }, alt_text: 'A ladder', title: plain('Ladder') }),
    ],
    [
      'a cell with parts',
      message(
        table([
          {
            type: 'rich_text',
            elements: [{ type: 'rich_text_section', elements: [{ type: 'text', text: 'a' }] }],
          },
        ]),
      ),
    ],
  ])('%s', (_, kept) => {
    expect(limitFaults(kept)).toEqual([]);
  });
});

describe('a message that breaks a limit is told so', () => {
  test.each([
    ['no text', { text: ' ', blocks: [section('a')] }],
    ['a text that is too long', { text: long(4001), blocks: [] }],
    ['fifty-one blocks', message(...Array.from({ length: 51 }, () => section('a')))],
    ['too many characters in all', message(...Array.from({ length: 5 }, () => section(long(2700))))],
    ['a block of no known kind', message({ type: 'carousel' })],
    ['a block that is none', message('words')],
    ['a section without words', message({ type: 'section' })],
    ['a section with an empty text', message(section(''))],
    ['a section of 3001', message(section(long(3001)))],
    ['eleven fields', message({ type: 'section', fields: Array(11).fill(plain('a')) })],
    ['a field of 2001', message({ type: 'section', fields: [plain(long(2001))] })],
    ['a header of 151', message({ type: 'header', text: plain(long(151)) })],
    ['a header with markup', message({ type: 'header', text: { type: 'mrkdwn', text: '*a*' } })],
    ['eleven context elements', message({ type: 'context', elements: Array(11).fill(plain('a')) })],
    ['no context element', message({ type: 'context', elements: [] })],
    [
      'twenty-six buttons',
      message(actions(...Array.from({ length: 26 }, (_, at) => button({ action_id: `a${at}` })))),
    ],
    ['a button of 76', message(actions(button({ text: plain(long(76)) })))],
    ['a button without words', message(actions(button({ text: undefined })))],
    ['a button value of 2001', message(actions(button({ value: long(2001) })))],
    ['a button address of 3001', message(actions(button({ url: long(3001) })))],
    ['a button label of 76', message(actions(button({ accessibility_label: long(76) })))],
    ['an action id of 256', message(actions(button({ action_id: long(256) })))],
    ['an action id twice', message(actions(button(), button()))],
    ['a block id of 256', message(section('a', { block_id: long(256) }))],
    ['a block id twice', message(section('a', { block_id: 'b' }), section('a', { block_id: 'b' }))],
    ['101 options', message(actions({ type: 'static_select', action_id: 's', options: options(101) }))],
    ['no option', message(actions({ type: 'static_select', action_id: 's', options: [] }))],
    [
      'an option of 76',
      message(
        actions({ type: 'static_select', action_id: 's', options: [{ text: plain(long(76)), value: 'v' }] }),
      ),
    ],
    [
      'an option value of 151',
      message(
        actions({ type: 'static_select', action_id: 's', options: [{ text: plain('a'), value: long(151) }] }),
      ),
    ],
    [
      'six lines in an overflow menu',
      message(section('a', { accessory: { type: 'overflow', options: options(6) } })),
    ],
    ['eleven boxes', message(actions({ type: 'checkboxes', options: options(11) }))],
    ['a placeholder of 151', message(input({ type: 'plain_text_input', placeholder: plain(long(151)) }))],
    [
      'a question to confirm of 101',
      message(
        actions(
          button({
            confirm: { title: plain(long(101)), text: plain('a'), confirm: plain('a'), deny: plain('a') },
          }),
        ),
      ),
    ],
    [
      'a word to confirm of 31',
      message(
        actions(
          button({
            confirm: { title: plain('a'), text: plain('a'), confirm: plain(long(31)), deny: plain('a') },
          }),
        ),
      ),
    ],
    ['a picture without alt text', message({ type: 'image', slack_file: { id: 'F1' } })],
    ['an alt text of 2001', message({ type: 'image', slack_file: { id: 'F1' }, alt_text: long(2001) })],
    ['a picture of nothing', message({ type: 'image', alt_text: 'a' })],
    ['an input label of 2001', message({ ...input({ type: 'plain_text_input' }), label: plain(long(2001)) })],
    ['an input without an element', message({ type: 'input', label: plain('a') })],
    ['an input that takes 3001', message(input({ type: 'plain_text_input', max_length: 3001 }))],
    ['two tables', message(table([cell('a')]), table([cell('a')]))],
    ['a table of 101 rows', message(table(...Array.from({ length: 101 }, () => [cell('a')])))],
    ['a table of 21 columns', message(table(Array.from({ length: 21 }, () => cell('a'))))],
    ['a table of 10001 characters', message(table([cell(long(10_001))]))],
    ['an empty cell', message(table([cell('')]))],
    ['a numeric cell', message(table([{ type: 'raw_number', value: 1 }]))],
    ['rows of two lengths', message(table([cell('a'), cell('b')], [cell('a')]))],
    ['markdown of 12001', message({ type: 'markdown', text: long(12_001) })],
  ])('%s', (_, broken) => {
    expect(limitFaults(broken).length).toBeGreaterThan(0);
  });
});

describe('a view', () => {
  const form = (more: object = {}) => ({
    type: 'modal',
    callback_id: 'ask',
    title: plain('Ask'),
    submit: plain('Ask'),
    close: plain('Leave'),
    blocks: [section('a')],
    ...more,
  });

  test('that keeps the limits', () => {
    expect(viewFaults(form())).toEqual([]);
    expect(viewFaults({ type: 'home', blocks: Array(100).fill(section('a')) })).toEqual([]);
  });

  test.each([
    ['is none', 'words'],
    ['has a title of 25', form({ title: plain(long(25)) })],
    ['is a form without a title', form({ title: undefined })],
    ['has a title with markup', form({ title: { type: 'mrkdwn', text: '*a*' } })],
    ['has a submit label of 25', form({ submit: plain(long(25)) })],
    ['has a close label of 25', form({ close: plain(long(25)) })],
    ['has private metadata of 3001', form({ private_metadata: long(3001) })],
    ['has a callback id of 256', form({ callback_id: long(256) })],
    ['has 101 blocks', form({ blocks: Array(101).fill(section('a')) })],
    ['has a table', form({ blocks: [table([cell('a')])] })],
    ['has 250,001 bytes', form({ blocks: Array(90).fill(section('é'.repeat(1400))) })],
  ])('that %s is told so', (_, view) => {
    expect(viewFaults(view).length).toBeGreaterThan(0);
  });
});
