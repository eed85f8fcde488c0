import { csvHead, csvRow, jsonLine } from '../../present/exported.ts';
import type { Store } from '../../records/store.ts';
import { askedFromNowhere, type RecordFilter } from '../../terms/records.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { everythingAllowed } from '../../workspaces/permissions.ts';
import { fromRecord } from '../../workspaces/records/body.ts';
import { readable } from '../../workspaces/records/reading.ts';

/** Whoever runs the bot can read its file. */
const operator = { place: 'operator', from: askedFromNowhere };

const entriesAtOnce = 200;

/** Writes the records that a filter lets through, a line each, oldest first; how many there were. */
export const exportRecords = async (
  store: Pick<Store, 'page'>,
  filter: RecordFilter,
  form: 'json' | 'csv',
  writeLine: (line: string) => void,
): Promise<Result<number>> => {
  if (form === 'csv') writeLine(csvHead());
  let [count, last] = [0, 0];
  for (;;) {
    const page = await store.page(filter, last, entriesAtOnce);
    if (!page.ok) return page;
    for (const entry of readable(everythingAllowed, operator, page.value)) {
      const body = fromRecord(entry);
      if (!body.ok) return body;
      const exported = { entry, answers: body.value.answers };
      writeLine(form === 'csv' ? csvRow(exported) : jsonLine(exported));
      count += 1;
    }
    last = page.value.at(-1)?.number ?? last;
    if (page.value.length < entriesAtOnce) return succeed(count);
  }
};
