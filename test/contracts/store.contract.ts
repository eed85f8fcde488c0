import { afterEach, describe, expect, test } from 'vitest';
import type { Store } from '../../src/records/store.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';
import { answerOf, askingAt, delicateCloses } from '../records/madeRecords.ts';

/** What every store of records must do. `open` gives an empty one. */
export const storeContract = (name: string, open: () => Promise<Store>): void => {
  describe(name, () => {
    const opened: Store[] = [];
    afterEach(async () => {
      for (const store of opened.splice(0)) await store.close();
    });
    const empty = async (): Promise<Store> => {
      const store = await open();
      opened.push(store);
      return store;
    };

    test('gives an answer back as it was kept, its prices to the last bit', async () => {
      const store = await empty();
      const answer = answerOf('R-A');
      accepted(await store.keep(answer, askingAt(1_000)));
      const found = accepted(await store.find('R-A'));
      expect(found).toEqual({ answer, askings: [askingAt(1_000)] });
      const closes = found?.answer.series[0]?.closes ?? [];
      expect(Array.from(closes, (close, at) => Object.is(close, delicateCloses[at]))).toEqual(
        delicateCloses.map(() => true),
      );
    });

    test('knows nothing of an id that was never given', async () => {
      const store = await empty();
      expect(accepted(await store.find('R-A'))).toBe(null);
      expect(accepted(await store.contentOf('R-A'))).toBe(null);
    });

    test('finds a comparison by each of its ids', async () => {
      const store = await empty();
      const series = [seriesOf('KELP', wobbling(9)), seriesOf('TARN', wobbling(8))];
      accepted(await store.keep(answerOf('R-A', { ids: ['R-A', 'R-C', 'R-B'], series }), askingAt(1)));
      for (const id of ['R-A', 'R-B', 'R-C']) {
        const found = accepted(await store.find(id));
        expect(found?.answer.ids).toEqual(['R-A', 'R-C', 'R-B']);
        expect(found?.answer.series).toEqual(series);
      }
    });

    test('keeps an answer once and each time that it was asked', async () => {
      const store = await empty();
      accepted(await store.keep(answerOf('R-A'), askingAt(2)));
      accepted(await store.keep(answerOf('R-A', { body: 'the same in other words' }), askingAt(5)));
      const found = accepted(await store.find('R-A'));
      expect(found?.askings.map(({ askedAtMs }) => askedAtMs)).toEqual([2, 5]);
      expect(found?.answer.body).toBe(answerOf('R-A').body);
      expect(accepted(await store.verify())).toMatchObject({ answers: 1, askings: 2, faults: [] });
    });

    test('refuses other content under an id that is taken, and keeps nothing of it', async () => {
      const store = await empty();
      accepted(await store.keep(answerOf('R-A'), askingAt(1)));
      const other = answerOf('R-A', { content: 'ff'.repeat(32) });
      expect(refusalCode(await store.keep(other, askingAt(2)))).toBe('storeUnavailable');
      expect(accepted(await store.contentOf('R-A'))).toBe(answerOf('R-A').content);
      expect(accepted(await store.verify())).toMatchObject({ answers: 1, askings: 1, faults: [] });
    });

    test('keeps all of an answer or nothing', async () => {
      const store = await empty();
      accepted(await store.keep(answerOf('R-A'), askingAt(1)));
      const before = accepted(await store.verify());
      const halfTaken = answerOf('R-B', { ids: ['R-B', 'R-A'] });
      expect(refusalCode(await store.keep(halfTaken, askingAt(2)))).toBe('storeUnavailable');
      expect(accepted(await store.find('R-B'))).toBe(null);
      expect(accepted(await store.verify())).toEqual(before);
    });

    test('lists the newest askings first, by ticker and from an instant on', async () => {
      const store = await empty();
      const tarn = { question: 'shape TARN', series: [seriesOf('TARN', wobbling(5))] };
      accepted(await store.keep(answerOf('R-A'), askingAt(10)));
      accepted(await store.keep(answerOf('R-B', tarn), askingAt(20)));
      accepted(await store.keep(answerOf('R-A'), askingAt(30)));
      const idsOf = async (ticker: string | null, sinceMs: number | null, most = 9) =>
        accepted(await store.list({ ticker, sinceMs }, most)).map(
          ({ id, askedAtMs }) => `${id} ${askedAtMs}`,
        );
      expect(await idsOf(null, null)).toEqual(['R-A 30', 'R-B 20', 'R-A 10']);
      expect(await idsOf(null, 20)).toEqual(['R-A 30', 'R-B 20']);
      expect(await idsOf('TARN', null)).toEqual(['R-B 20']);
      expect(await idsOf('KELP', 11)).toEqual(['R-A 30']);
      expect(await idsOf('WREN', null)).toEqual([]);
      expect(await idsOf(null, null, 1)).toEqual(['R-A 30']);
    });

    test('gives whole entries page by page in the order in which they were kept', async () => {
      const store = await empty();
      const series = [seriesOf('KELP', wobbling(5)), seriesOf('TARN', wobbling(6))];
      accepted(await store.keep(answerOf('R-A'), askingAt(30)));
      accepted(await store.keep(answerOf('R-B', { ids: ['R-B', 'R-C'], series }), askingAt(20)));
      accepted(await store.keep(answerOf('R-A'), askingAt(10)));
      const all = { ticker: null, sinceMs: null };
      const first = accepted(await store.page(all, 0, 2));
      expect(first.map(({ ids }) => ids)).toEqual([['R-A'], ['R-B', 'R-C']]);
      const { series: _series, ...whole } = answerOf('R-B', { ids: ['R-B', 'R-C'] });
      expect(first[1]).toMatchObject({ ...whole, tickers: ['KELP', 'TARN'], asking: askingAt(20) });
      const rest = accepted(await store.page(all, first[1]?.number ?? 0, 2));
      expect(rest.map(({ asking }) => asking.askedAtMs)).toEqual([10]);
      const tarn = accepted(await store.page({ ticker: 'TARN', sinceMs: 20 }, 0, 9));
      expect(tarn.map(({ ids }) => ids[0])).toEqual(['R-B']);
    });

    test('forgets what is old with a trace, and nothing that was asked since', async () => {
      const store = await empty();
      const tarn = { series: [seriesOf('TARN', wobbling(5))] };
      accepted(await store.keep(answerOf('R-A'), askingAt(10)));
      accepted(await store.keep(answerOf('R-B', tarn), askingAt(20)));
      accepted(await store.keep(answerOf('R-A'), askingAt(30)));
      const { head } = accepted(await store.verify());
      expect(accepted(await store.forgetBefore(10))).toBe(0);
      expect(accepted(await store.forgetBefore(25))).toBe(2);
      expect(accepted(await store.find('R-B'))).toBe(null);
      expect(accepted(await store.find('R-A'))?.askings.map(({ askedAtMs }) => askedAtMs)).toEqual([30]);
      const after = accepted(await store.verify());
      expect(after).toMatchObject({ answers: 1, askings: 1, deletions: 3, faults: [] });
      expect(after.head).not.toBe(head);
    });

    test('can keep again what it has forgotten', async () => {
      const store = await empty();
      accepted(await store.keep(answerOf('R-A'), askingAt(10)));
      accepted(await store.forgetBefore(11));
      accepted(await store.keep(answerOf('R-A'), askingAt(20)));
      expect(accepted(await store.find('R-A'))?.askings).toHaveLength(1);
      expect(accepted(await store.verify())).toMatchObject({ answers: 1, faults: [] });
    });

    test('serves many at once without mixing them up', async () => {
      const store = await empty();
      const ids = Array.from({ length: 20 }, (_, index) => `R-${index}`);
      await Promise.all(
        ids.map(async (id, index) => accepted(await store.keep(answerOf(id), askingAt(index)))),
      );
      expect(accepted(await store.verify())).toMatchObject({ answers: 20, askings: 20, faults: [] });
    });
  });
};
