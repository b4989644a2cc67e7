import type { RowsReport } from '../../exchange/table/rows-order.js';
import { workedRows } from '../../exchange/table/worked-rows.js';
import type { RowsSummary, RowsTask, WorkedRow } from '../../exchange/table/worked-rows.js';
import { inPage, inWorker } from '../parts/sliced-work.js';
import type { Running } from '../parts/sliced-work.js';
import { startRows } from '../parts/worker-place.js';

/** Who waits for rows to be worked out. */
export interface RowsListener {
  rows(rows: readonly WorkedRow[]): void;
  summary(summary: RowsSummary): void;
  failed(error: string): void;
}

/** Up to so many rows a page works out by itself before a worker has even started. */
const FEW = 500;

/** Works the rows of a sheet out: a long sheet beside the page's thread, or in the page where it lets no worker start. */
export function workRows(task: RowsTask, text: string, listener: RowsListener): Running {
  const here = (): Running =>
    inPage(workedRows(task), { piece: (rows) => listener.rows(rows), whole: (summary) => listener.summary(summary), failed: (error) => listener.failed(error) });
  if (task.table.rows.length <= FEW) return here();
  const bytes = new TextEncoder().encode(text);
  const { table: _, ...rest } = task;
  let running: Running | undefined;
  let refused = false;
  const beside = inWorker<RowsReport>(
    startRows, { ...rest, bytes },
    (said) => {
      if ('rows' in said) {
        listener.rows(said.rows);
        return 'more';
      }
      if ('summary' in said) listener.summary(said.summary);
      else listener.failed(said.error);
      return 'last';
    },
    () => {
      refused = true;
      running = here();
    },
    [bytes.buffer],
  );
  if (!refused) running ??= beside;
  return { stop: () => (running ?? beside).stop() };
}
