/** Digests and watches as people ask for them, on the demonstration prices. */
import { beforeAll, describe, expect, test } from 'vitest';
import { inWords } from '../../src/present/words.ts';
import type { Converse } from '../../src/workspaces/converse.ts';
import { demoConverse } from './demoDesk.ts';

let converse: Converse;
beforeAll(async () => {
  converse = await demoConverse();
});

const asked = async (text: string) => {
  const spoken = await converse.ask({ text, place: 'terminal' });
  return spoken.map(({ reply }) => reply);
};

const sentence = async (text: string): Promise<string> => (await asked(text))[0]?.sentence ?? 'nothing';
const code = async (text: string): Promise<string | undefined> => {
  const [spoken] = await converse.ask({ text, place: 'terminal' });
  return spoken?.outcome?.ok === false ? spoken.outcome.problem.code : undefined;
};

// The desk of the demonstration is in UTC, on Saturday 2026-11-28, and knows no holidays.
describe('a digest', () => {
  test('is made, and the reply says when it is posted next', async () => {
    const [made] = await asked('digest KELP TARN');
    expect(made?.sentence).toBe('D-1 is made. Next post: Monday 2026-11-30 08:30 UTC.');
    expect(made === undefined ? '' : inWords(made)).toContain(
      'digest sessions 08:30 UTC KELP TARN 500d at 99% by student',
    );
    expect(made === undefined ? '' : inWords(made)).toContain('No holidays are known here');
  });

  test('shows now what it would post: a line per ticker, by chance, ids and the caution in full', async () => {
    const [now] = await asked('digest now D-1');
    expect(now?.sentence).toMatch(
      /^\d loss(es)? exceeded (its|their) figure and .* chance alone would bring 0\.020? and 0\.22 among 2 tickers\.$/,
    );
    expect(now?.table?.rows.map(([ticker]) => ticker).sort()).toEqual(['KELP', 'TARN']);
    expect(now?.table?.columns).toHaveLength(8);
    expect(now === undefined ? '' : inWords(now)).toMatch(/tail R-[0-9A-Z]{10}, backtest R-[0-9A-Z]{10}/);
    expect(now?.caution).toContain('licensed advisers');
    const [again] = /R-[0-9A-Z]{10}/.exec(now === undefined ? '' : inWords(now)) ?? [''];
    expect((await asked(`again ${again}`))[0]?.kind).toBe('record');
  });

  test('is drawn, the figures beside the picture', async () => {
    const [spoken] = await converse.ask({ text: 'digest now D-1 as picture', place: 'terminal' });
    expect(spoken?.pictures).toHaveLength(1);
    expect(spoken?.pictures?.[0]?.altText).toMatch(/KELP VaR/);
    expect(spoken?.reply.table?.rows).toHaveLength(2);
  });

  test('is changed, paused, taken up, listed and stopped', async () => {
    expect(await sentence('digest change D-1 09:00 mon,thu')).toBe(
      'D-1 is changed. Next post: Monday 2026-11-30 09:00 UTC.',
    );
    expect(await sentence('digest pause D-1')).toBe('D-1 is paused. digest resume D-1 takes it up.');
    expect(await sentence('digest resume D-1')).toBe(
      'D-1 is going on. Next post: Monday 2026-11-30 09:00 UTC.',
    );
    const [list] = await asked('digest list');
    expect(list?.passages[0]?.lines).toEqual([
      'D-1 (active): digest mon,thu 09:00 UTC KELP TARN 500d at 99% by student; next Monday 2026-11-30 09:00 UTC',
    ]);
    expect(await sentence('digest stop D-1')).toBe('D-1 is stopped. Its id is not used again.');
    expect(await sentence('digest list')).toBe('0 digests here.');
    expect(await sentence('digest KELP')).toContain('D-2 is made.');
  });

  test.each([
    ['digest now D-9', 'unknownSubscription'],
    ['digest resume D-1', 'unknownSubscription'],
    ['digest stop D-9', 'unknownSubscription'],
  ])('%s is refused', async (text, expected) => {
    expect(await code(text)).toBe(expected);
  });
});

describe('a watch', () => {
  test('is made, and the reply says what it sees now', async () => {
    const [made] = await asked('watch KELP tail 99% above 4%');
    expect(made?.sentence).toBe('W-1 is made. It looks once at each new session of prices, and speaks here.');
    expect(made === undefined ? '' : inWords(made)).toMatch(
      /KELP’s 99% VaR is 2\.\d+% \(at 95% .*\) now, on the quiet side of the line\./,
    );
    const [already] = await asked('watch KELP tail above 1%');
    expect(already === undefined ? '' : inWords(already)).toContain('already above the line');
  });

  test('of losses says which figure they are held against', async () => {
    const [made] = await asked('watch KELP loss beyond tail');
    expect(made === undefined ? '' : inWords(made)).toContain(
      'the losses after 2026-11-27 are held against the figure of the session before each',
    );
  });

  test('is listed, paused, taken up and stopped', async () => {
    expect(await sentence('watch list')).toBe('3 watches here.');
    expect(await sentence('watch pause W-3')).toBe('W-3 is paused. watch resume W-3 takes it up.');
    expect(await sentence('watch resume W-3')).toBe('W-3 is going on.');
    expect(await sentence('watch stop W-3')).toBe('W-3 is stopped. Its id is not used again.');
    expect(await sentence('watch list')).toBe('2 watches here.');
  });
});

test('a command that only reads makes nothing', async () => {
  const reading = await demoConverse(false);
  const [spoken] = await reading.ask({ text: 'digest KELP', place: 'terminal' });
  expect(spoken?.outcome?.ok === false ? spoken.outcome.problem.code : '').toBe('storeUnavailable');
  const [list] = await reading.ask({ text: 'digest list', place: 'terminal' });
  expect(list?.reply.sentence).toBe('0 digests here.');
});
