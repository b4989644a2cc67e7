// Works the rows of a sheet out off the page's thread. One order a worker: to cancel it, end the worker.

import { readTable } from './exchange/table/read-table.js';
import { textOfBytes } from './exchange/table/bytes.js';
import { workedRows } from './exchange/table/worked-rows.js';
import type { RowsOrder, RowsReport } from './exchange/table/rows-order.js';

const report = (said: RowsReport): void => self.postMessage(said);

self.addEventListener('message', ({ data: { bytes, ...rest } }: MessageEvent<RowsOrder>) => {
  try {
    const table = readTable(textOfBytes(bytes));
    if ('fault' in table) throw new Error(table.fault.code);
    const slices = workedRows({ ...rest, table });
    for (;;) {
      const { done, value } = slices.next();
      if (done) return report({ summary: value });
      report({ rows: value });
    }
  } catch (error) {
    report({ error: String(error) });
  }
});
