import { describe, expect, test } from 'vitest';
import { reply } from '../../../src/present/reply.ts';
import { problem } from '../../../src/terms/problem.ts';
import { refuse } from '../../../src/terms/result.ts';
import type { Converse } from '../../../src/workspaces/converse.ts';
import {
  firstDifference,
  readSession,
  recorded,
  typingAgain,
} from '../../../src/workspaces/terminal/session.ts';
import { startTerminal, type Terminal } from '../../../src/workspaces/terminal/start.ts';

/** Repeats what it is asked, in so many words more. */
const repeating = (more = ''): Converse => ({
  ask: async ({ text }) => [{ reply: reply('answer', `You asked ${text}${more}`), outcome: null }],
  overhear: async () => [],
  press: async () => [],
});

const terminalWith = (typed: readonly string[], interactive = true): Terminal => {
  const left = [...typed];
  return {
    nextLine: async () => left.shift() ?? null,
    write: () => {},
    hint: () => {},
    width: () => 60,
    savePicture: async () => refuse(problem('fileUnwritable', 'No place.')),
    interactive,
  };
};

const beside = {
  sitting: 's',
  pinned: async () => reply('record', 'Nothing is pinned.'),
  home: async () => reply('help', 'Home.'),
};

const record = async (typed: readonly string[], interactive = true): Promise<string> => {
  const lines: string[] = [];
  await startTerminal(
    recorded(terminalWith(typed, interactive), (line) => void lines.push(line)),
    repeating(),
    beside,
  );
  return `${lines.join('\n')}\n`;
};

const replay = async (file: string, converse = repeating()) => {
  const session = readSession(file);
  if (session === null) throw new Error('no session');
  const lines: string[] = [];
  const terminal = recorded(typingAgain(terminalWith([], false), session), (line) => void lines.push(line));
  await startTerminal(terminal, converse, beside);
  return firstDifference(session, lines);
};

describe('a session', () => {
  const typed = ['interval KELP', '', '#risk', 'thread 9', 'see', 'home', 'leave', 'never read'];

  test('is written down in lines that a person can read', async () => {
    expect(await record(['interval KELP', 'thread 9'])).toBe(
      [
        'leadsman session 1, width 60',
        '> interval KELP',
        '    You asked interval KELP',
        '  ',
        '> thread 9',
        '  There is no message 9: 1 to 1 can be answered.',
        '',
      ].join('\n'),
    );
  });

  test.each([true, false])(
    'types itself again and comes out the same (somebody typed: %s)',
    async (interactive) => {
      expect(await replay(await record(typed, interactive))).toBe(null);
    },
  );

  test('that an editor has taken the last blanks from comes out the same', async () => {
    expect(await replay((await record(typed)).replace(/ +$/gm, ''))).toBe(null);
  });

  test('that comes out otherwise says the first line that differs', async () => {
    expect(await replay(await record(['interval KELP', 'tail KELP']), repeating('!'))).toEqual({
      line: 3,
      expected: '    You asked interval KELP',
      came: '    You asked interval KELP!',
    });
  });

  test('is the same at another time of the day', async () => {
    const file = await record(['2026-12-01 14:58 UTC R-A', '2026-12-01 14:58 Europe/London R-B']);
    expect(
      await replay(file.replaceAll('    You asked 2026-12-01 14:58', '    You asked 2026-12-02 09:03')),
    ).toBe(null);
    expect(await replay(file.replaceAll('    You asked 2026', '    You asked 202'))).not.toBe(null);
  });

  test('of which less or more is shown says so too', async () => {
    const file = await record(['interval KELP']);
    expect(await replay(`${file}  and more\n`)).toMatchObject({
      line: 5,
      expected: '  and more',
      came: '(nothing)',
    });
    expect(await replay(file.split('\n').slice(0, 2).join('\n'))).toMatchObject({
      line: null,
      expected: '(nothing)',
    });
  });

  test.each(['', 'some words', 'leadsman session 2, width 60', 'leadsman session 1, width 60\nunmarked'])(
    '"%s" is none',
    (file) => {
      expect(readSession(file)).toBe(null);
    },
  );
});
