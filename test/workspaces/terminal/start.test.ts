import { describe, expect, test } from 'vitest';
import { type Reply, reply } from '../../../src/present/reply.ts';
import { succeed } from '../../../src/terms/result.ts';
import type { Asking, Converse, Pressing } from '../../../src/workspaces/converse.ts';
import { demonstrationQuestions, startTerminal } from '../../../src/workspaces/terminal/start.ts';
import { emptyPng } from '../../doubles/drawing.ts';

const drawn = {
  png: emptyPng,
  altText: 'Closes.',
  title: 'KELP',
  fileName: 'kelp.png',
  inText: [{ head: null, lines: ['▁▂▃'] }],
};

/** A conversation that repeats what it is asked, and a terminal that keeps what is written on it. */
const sitDown = async (typed: readonly string[], interactive = false) => {
  const asked: Asking[] = [];
  const pressed: Pressing[] = [];
  const answer = (text: string): Reply =>
    reply('answer', `You asked ${text}`, {
      buttons: [{ action: 'working', label: `Working of ${text}`, answerId: 'R-0000000000', question: text }],
    });
  const converse: Converse = {
    ask: async (asking) => {
      asked.push(asking);
      const pictures = asking.text.includes('picture') ? [drawn] : [];
      return [{ reply: answer(asking.text), outcome: null, pictures }];
    },
    overhear: async () => [],
    press: async (pressing) => {
      pressed.push(pressing);
      return [{ reply: reply('working', `Working of ${pressing.question}.`), outcome: null }];
    },
  };
  let screen = '';
  const left = [...typed];
  const prompts: string[] = [];
  const nextLine = async (prompt: string) => {
    prompts.push(prompt);
    return left.shift() ?? null;
  };
  const write = (text: string) => {
    screen += text;
  };
  let pictureCount = 0;
  const savePicture = async () => {
    pictureCount += 1;
    return succeed(`pictures/${pictureCount}.png`);
  };
  const count = await startTerminal(
    { nextLine, write, hint: write, width: () => 80, interactive, savePicture },
    converse,
    {
      sitting: 's',
      pinned: async () => reply('record', 'Pinned here: 2.'),
      home: async (page) => reply('help', `Home, page ${page}.`),
    },
  );
  return { asked, pressed, screen, count, prompts };
};

describe('the terminal workspace', () => {
  test('answers line by line, and shows what it read where nobody types', async () => {
    const { asked, screen, count } = await sitDown(['interval KELP', '', 'feed']);
    expect(asked.map(({ text }) => text)).toEqual(['interval KELP', 'feed']);
    expect(screen).toContain('#desk> interval KELP\n  You asked interval KELP\n');
    expect(count).toBe(2);
  });

  test('shows what is pinned, which is no message to the bot', async () => {
    const { asked, screen } = await sitDown(['pinned']);
    expect(asked).toEqual([]);
    expect(screen).toContain('  Pinned here: 2.');
  });

  test('a picture is written to a file, whose path stands below, with its form in text', async () => {
    const { screen } = await sitDown(['feed KELP as picture']);
    expect(screen).toContain('  ▁▂▃\n');
    expect(screen).toContain('\n  Picture: pictures/1.png\n');
  });

  test('with nothing typed at all it shows three questions with their answers', async () => {
    const { asked } = await sitDown([]);
    expect(asked.map(({ text }) => text)).toEqual([...demonstrationQuestions]);
    expect(demonstrationQuestions).toHaveLength(3);
  });

  test('a person who types gets a welcome and prompts, and no demonstration', async () => {
    const { asked, screen, prompts } = await sitDown(['#risk'], true);
    expect(asked).toEqual([]);
    expect(screen).toContain('interval KELP 60d');
    expect(prompts).toEqual(['#desk> ', '#risk> ']);
  });

  test('channels, direct messages and threads are places to be in', async () => {
    const { asked, screen } = await sitDown([
      '#risk',
      'feed',
      'thread 1',
      'feed',
      'top',
      '@leadsman',
      'feed',
    ]);
    expect(asked.map(({ place }) => place)).toEqual(['channel', 'channel', 'direct']);
    expect(screen).toContain('#risk thread 1> feed');
    expect(screen).toContain('@leadsman> feed');
  });

  test('a button is pressed by its number, counted through the whole conversation', async () => {
    const { screen } = await sitDown(['first', 'second', 'press 2']);
    expect(screen).toContain('[2] Working of second');
    expect(screen).toContain('Working of second.');
  });

  test('messages and presses come from the thread that they stand in', async () => {
    const { asked, pressed } = await sitDown([
      'first',
      'thread 1',
      'second',
      'top',
      '#risk',
      'third',
      'press 2',
    ]);
    expect(asked.map(({ from }) => [from?.channel, from?.message, from?.thread])).toEqual([
      ['#desk', 's:1', null],
      ['#desk', 's:2', 's:1'],
      ['#risk', 's:3', null],
    ]);
    expect(pressed).toMatchObject([{ from: { team: null, person: 'you', message: 's:1', thread: 's:1' } }]);
  });

  test('see says where pictures are, and home shows a page', async () => {
    const { screen, asked } = await sitDown([
      'KELP as picture',
      'TARN as picture',
      'see 1',
      'see',
      'home',
      'home 3',
    ]);
    expect(screen).toMatch(/> see 1\nPicture: pictures\/1\.png\n/);
    expect(screen).toMatch(/> see\nPicture: pictures\/2\.png\n/);
    expect(screen).toContain('Home, page 1.');
    expect(screen).toContain('Home, page 3.');
    expect(asked).toHaveLength(2);
  });

  test.each([
    [['see'], 'There is no picture yet. Ask for one'],
    [['KELP as picture', 'see 2'], 'There is no picture 2: see 1 to 1.'],
    [['press 1'], 'There is no button yet.'],
    [['feed', 'press 7'], 'There is no button 7: press 1 to 1.'],
    [['thread 3'], 'There is no message yet.'],
    [['feed', 'thread 3'], 'There is no message 3: 1 to 1 can be answered.'],
  ])('%j says what would be right', async (typed, expected) => {
    expect((await sitDown(typed)).screen).toContain(expected);
  });

  test('leave ends it, with lines still to come', async () => {
    const { asked } = await sitDown(['feed', 'leave', 'feed']);
    expect(asked).toHaveLength(1);
  });
});
