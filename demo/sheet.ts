import { TabulatorFull } from 'tabulator-tables';
import 'tabulator-tables/dist/css/tabulator_simple.min.css';
import 'esterway/define';
import 'esterway/sheets';
import { columnLetters, gridHost } from './grid-host.ts';
import { plant } from './plant.ts';
import { applyToPage, readSettings } from './settings.ts';
import { sheetRows } from './sheet-rows.ts';

// the page itself speaks English only
applyToPage({ ...readSettings(), lang: 'en' });

const MOST_COLUMNS = 20;
const letters = columnLetters(MOST_COLUMNS);
const undo = document.querySelector<HTMLButtonElement>('#undo')!;
const selection = document.querySelector('#selection')!;

const grid = new TabulatorFull('#grid', {
  data: sheetRows.map((cells, i) => ({ id: i + 1, ...Object.fromEntries(letters.map((letter, column) => [letter, cells[column] ?? ''])) })),
  columns: letters.map((letter, i) => ({ title: letter, field: letter, width: [90, 160, 104][i] ?? 84, headerSort: false, editor: 'input' as const })),
  rowHeader: { field: 'id', width: 44, headerSort: false, hozAlign: 'right', resizable: false, frozen: true },
  columnDefaults: { resizable: 'header' },
  height: 'max(320px, 100vh - 270px)',
  selectableRange: 1,
  selectableRangeColumns: true,
  selectableRangeRows: true,
  editTriggerEvent: 'dblclick',
  clipboard: true,
  clipboardCopyStyled: false,
  clipboardCopyRowRange: 'range',
  clipboardPasteParser: 'range',
  clipboardPasteAction: 'range',
});

grid.on('tableBuilt', () => {
  const host = gridHost(grid, 'Deliveries', letters);
  const rows = document.querySelector('esterway-rows')!;
  rows.host = host;
  rows.site = plant;
  host.follow(({ address, cells }) => {
    selection.textContent = `Selected: ${address}, ${cells.length} rows`;
  });
  undo.addEventListener('click', () => {
    selection.textContent = host.takeBack() ? 'The last block was taken back.' : 'There is nothing to take back.';
  });
  // all deliveries are selected to begin with
  const [first] = grid.getRows();
  const last = grid.getRows().at(-1);
  const [from, to] = [first?.getCell('A'), last?.getCell('G')];
  if (from && to) grid.addRange(from, to);
  scrollTo(0, 0); // a selection draws the grid into view
  document.documentElement.dataset['ready'] = 'yes';
});
