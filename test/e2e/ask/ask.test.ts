import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, test } from 'vitest';
import { recordsFile, run } from './run.ts';

const folder = mkdtempSync(join(tmpdir(), 'leadsman-ask-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const written = (name: string, text: string): string => {
  const path = join(folder, name);
  writeFileSync(path, text);
  return path;
};

/** Prices of one ticker that stands still and one that moves, ten days. */
const feed = written(
  'prices.csv',
  `date,ticker,close\n${Array.from({ length: 10 }, (_, index) => {
    const day = `2026-11-${String(index + 2).padStart(2, '0')}`;
    return `${day},STILL,5\n${day},KELP,${100 + (index % 3)}`;
  }).join('\n')}\n`,
);

describe('one question from the command line', () => {
  test('the answer goes to standard output, exit 0', async () => {
    const { code, stdout, stderr } = await run('ask', ['interval KELP 60d']);
    expect({ code, stderr }).toEqual({ code: 0, stderr: '' });
    expect(stdout).toMatch(/^KELP’s mean daily return over 60 days is /);
    expect(stdout).toContain('desk policy decides.');
  });

  test('JSON has every documented key', async () => {
    const { stdout } = await run('ask', ['--json', 'interval KELP 60d']);
    const document = JSON.parse(stdout) as { ok: boolean; answer: Record<string, unknown> };
    expect(document.ok).toBe(true);
    expect(Object.keys(document.answer)).toEqual(
      expect.arrayContaining(
        'schemaVersion methodVersion id verb question assumed subject asOf window returnCount returnType droppedDates longestGapDays currency quoteUnit priceAdjustment periodsPerYear seed dataFingerprint figures warnings notes method sources working text'.split(
          ' ',
        ),
      ),
    );
    expect(Object.keys(document.answer['figures'] as object)).toEqual(
      expect.arrayContaining(
        'mean sampleStandardDeviation standardError degreesOfFreedom confidenceLevel side criticalT lower upper normalLower normalUpper predictionLower predictionUpper annualMean annualLower annualUpper lag1Autocorrelation ljungBoxQ ljungBoxP ljungBoxLags robustQ robustQP neweyWestLower neweyWestUpper bootstrapMethod bootstrapLower bootstrapUpper skewness excessKurtosis ladder widths trust'.split(
          ' ',
        ),
      ),
    );
  });

  test('a picture is written where it was asked for, and that is said', async () => {
    const file = join(folder, 'pictures', 'one.png');
    const { code, stdout } = await run('ask', ['--picture', file, 'interval KELP 60d']);
    expect(code).toBe(0);
    expect(stdout).toContain(`Picture: ${file}`);
    expect([...readFileSync(file).subarray(1, 4)]).toEqual([...Buffer.from('PNG')]);
  });

  test('a picture that cannot be written is refused, with the answer given', async () => {
    const { code, stdout, stderr } = await run('ask', [
      '--picture',
      join(feed, 'one.png'),
      'interval KELP 60d',
    ]);
    expect(code).toBe(2);
    expect(stdout).toMatch(/^KELP’s mean daily return/);
    expect(stderr).toMatch(/^The picture cannot be written to /);
  });

  test('the same question gives the same bytes', async () => {
    const [first, second] = await Promise.all(
      [1, 2].map(() => run('ask', ['--json', 'interval LIMPET 60d robust'])),
    );
    expect(first?.stdout).toBe(second?.stdout);
    expect(first?.code).toBe(0);
  });

  test.each([
    ['an unknown ticker', ['interval KEPL'], 'unknownTicker', 'KELP'],
    ['a window longer than the history', ['interval KELP 60d'], 'windowTooLong', '9 returns'],
    ['a window without a return', ['interval KELP since 2026-11-25'], 'windowEmpty', 'No return'],
    ['a price that does not move', ['interval STILL 9d'], 'priceDoesNotMove', 'does not move'],
    ['words that are not read', ['interval KELP sideways'], 'unreadableWords', 'sideways'],
    ['no verb', ['good morning'], 'noVerb', 'verb'],
    ['a level of a hundred', ['interval KELP 5d at 100%'], 'levelOutside', '100%'],
  ])('%s is refused with its code on standard error, exit 2', async (_name, words, code, hint) => {
    const ran = await run('ask', ['--feed', feed, '--json', ...words]);
    expect({ code: ran.code, stdout: ran.stdout }).toEqual({ code: 2, stdout: '' });
    const { ok, problem } = JSON.parse(ran.stderr) as { ok: boolean; problem: Record<string, unknown> };
    expect([ok, problem['code'], Object.keys(problem)]).toEqual([
      false,
      code,
      ['code', 'message', 'position', 'suggestion'],
    ]);
    expect(problem['message']).toContain(hint);
  });

  test.each([
    ['a feed that is not there', ['--feed', join(folder, 'nowhere.csv'), 'interval KELP'], 'nowhere.csv'],
    [
      'a half-written feed',
      [
        '--feed',
        written('half.csv', 'date,ticker,close\n2026-11-02,KELP,10\n2026-11-03,KE'),
        'interval KELP 1d',
      ],
      'half.csv',
    ],
    [
      'settings that are not there',
      ['--config', join(folder, 'nowhere.yaml'), 'interval KELP'],
      'nowhere.yaml',
    ],
    [
      'settings that are wrong',
      ['--config', written('bad.yaml', 'feed: {path: 1}\nworkspace: pub\n'), 'interval KELP'],
      'workspace',
    ],
    ['an option that there is not', ['--fede', feed, 'interval KELP'], '--fede'],
    ['no question', [], 'No question'],
  ])('%s is refused in words, exit 2', async (_name, words, hint) => {
    const { code, stdout, stderr } = await run('ask', words);
    expect({ code, stdout }).toEqual({ code: 2, stdout: '' });
    expect(stderr).toContain(hint);
    expect(stderr).not.toContain('    at ');
  });
});

describe('the workspace in the terminal', () => {
  test('piped lines are answered one by one, exit 0', async () => {
    const { code, stdout } = await run('serve', [], 'interval KELP 60d\npress 1\nhelp\n');
    expect(code).toBe(0);
    expect(stdout).toContain('#desk> interval KELP 60d');
    expect(stdout).toContain('The working of R-');
    expect(stdout).toContain('Ask how far');
  });

  test('with the input closed at once it shows three questions with their answers, exit 0', async () => {
    const { code, stdout } = await run('serve', []);
    expect(code).toBe(0);
    expect(stdout.match(/^#desk> /gm)).toHaveLength(3);
  });

  test('some of the tokens but not all is an error that names the missing one', async () => {
    const { code, stderr } = await run('serve', [], null, { SLACK_BOT_TOKEN: 'xoxb-not-real' });
    expect(code).toBe(2);
    expect(stderr).toContain('SLACK_APP_TOKEN');
    expect(stderr).not.toContain('xoxb-not-real');
  });

  test('told to be in Slack without tokens it never falls back to the terminal', async () => {
    const { code, stdout, stderr } = await run('serve', ['--workspace', 'slack'], 'interval KELP\n');
    expect({ code, stdout }).toEqual({ code: 2, stdout: '' });
    expect(stderr).toContain('SLACK_BOT_TOKEN and SLACK_APP_TOKEN');
  });

  test('a platform that cannot be reached is said, exit 2', async () => {
    const { code, stderr } = await run('serve', [], null, {
      SLACK_BOT_TOKEN: 'xoxb-not-real',
      SLACK_APP_TOKEN: 'xapp-not-real',
      SLACK_API_URL: 'http://127.0.0.1:9/api/',
    });
    expect(code).toBe(2);
    expect(stderr).toContain('did not answer');
    expect(stderr).not.toContain('not-real');
  });
});

describe('answers on record', () => {
  test('the command line keeps one only where it is told to, and recomputes it later', async () => {
    const asked = ['interval BRINE 60d'];
    const id = /R-\w{10}/.exec((await run('ask', asked)).stdout)?.[0] ?? 'no id';
    const unknown = await run('ask', ['--json', `again ${id}`]);
    expect([unknown.code, JSON.parse(unknown.stderr).problem.code]).toEqual([2, 'unknownRecord']);
    expect((await run('ask', ['--keep', ...asked])).code).toBe(0);
    const again = await run('ask', [`again ${id}`]);
    expect([again.code, again.stderr]).toEqual([0, '']);
    expect(again.stdout).toContain(`${id} comes out the same to the last bit`);
    expect((await run('ask', ['records BRINE'])).stdout).toContain(id);
    expect((await run('ask', ['records verify'])).stdout).toContain('The records are whole');
  });

  test('records are exported, copied, and restored from the copy', async () => {
    await run('ask', ['--keep', 'interval CURLEW 60d']);
    const lines = (await run('export', ['--ticker', 'CURLEW'])).stdout.trim().split('\n');
    expect(lines.map((line) => JSON.parse(line).words)).toEqual(['interval CURLEW 60d']);
    expect((await run('export', ['--csv', '--since', '2100-01-01'])).stdout).toMatch(
      /^number,askedAt,id,[\w,]+\n$/,
    );
    const copy = join(folder, 'copy.db');
    expect((await run('backup', [copy])).code).toBe(0);
    const restored = await run('ask', ['--records', copy, 'records CURLEW']);
    expect(restored.stdout).toContain('1 answer on record about CURLEW.');
  });

  test.each([
    ['export', ['--since', 'yesterday'], 'yesterday'],
    ['export', ['--tickers', 'KELP'], '--tickers'],
    ['backup', [], 'Name the one file'],
    ['backup', [recordsFile], 'the file of the records itself'],
    ['backup', ['--records', join(folder, 'none.db'), 'copy.db'], 'There are no records'],
  ] as const)('%s %j is refused in words, exit 2', async (script, words, hint) => {
    await run('ask', ['--keep', 'interval CURLEW 60d']);
    const { code, stdout, stderr } = await run(script, words);
    expect({ code, stdout }).toEqual({ code: 2, stdout: '' });
    expect(stderr).toContain(hint);
  });

  test('records that cannot be used take no answer from anybody', async () => {
    const letter = written('letter.db', 'Dear Sir, this is no database at all.'.repeat(40));
    const kept = await run('ask', ['--records', letter, '--keep', 'interval KELP 60d']);
    expect(kept.code).toBe(0);
    expect(kept.stdout.replace(/\s+/g, ' ')).toContain('Not kept on record: the store cannot be written now');
    expect(kept.stderr).toContain('was given but not kept');
    const again = await run('ask', ['--records', letter, '--json', 'records']);
    expect([again.code, JSON.parse(again.stderr).problem.code]).toEqual([2, 'storeUnavailable']);
  });

  test('the workspace in the terminal keeps what it answers', async () => {
    const { stdout } = await run('serve', [], 'interval DULSE 60d\nrecords DULSE\n');
    expect(stdout).toContain('1 answer on record about DULSE.');
  });
});
