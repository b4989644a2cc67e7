import { strToU8, zipSync } from 'fflate';
import { Decimal } from '../../formula/decimal.js';
import { address } from './cells.js';
import type { Cell, Look, SheetPage, SheetRow } from './cells.js';
import { cellText, xmlText } from './xml-text.js';
import { guardedText } from '../results/table-text.js';

// The few parts of an Office Open XML workbook (ECMA-376) that cells, formulas and their results need.

const HEADER = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
const MAIN = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const OFFICE = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const PACKAGE = 'http://schemas.openxmlformats.org/package/2006';
const SHEET_TYPE = 'application/vnd.openxmlformats-officedocument.spreadsheetml';

/** The media type of the file. */
export const WORKBOOK_TYPE = `${SHEET_TYPE}.sheet`;

/** The bytes of an .xlsx file. The same pages give the same bytes. */
export function officeFile(pages: readonly SheetPage[]): Uint8Array {
  const parts: Record<string, string> = {
    '[Content_Types].xml': contentTypes(pages.length),
    '_rels/.rels': relations([['officeDocument', 'xl/workbook.xml']]),
    'xl/workbook.xml': workbook(pages),
    'xl/_rels/workbook.xml.rels': relations([...pages.map((_, at) => ['worksheet', `worksheets/sheet${at + 1}.xml`] as const), ['styles', 'styles.xml']]),
    'xl/styles.xml': styles(),
  };
  pages.forEach((page, at) => (parts[`xl/worksheets/sheet${at + 1}.xml`] = sheet(page)));
  const files = Object.fromEntries(Object.entries(parts).map(([path, xml]) => [path, strToU8(HEADER + xml)]));
  return zipSync(files, { mtime: new Date(1980, 0, 1) });
}

function contentTypes(sheets: number): string {
  const part = (path: string, type: string): string => `<Override PartName="/xl/${path}.xml" ContentType="${SHEET_TYPE}.${type}+xml"/>`;
  const all = Array.from({ length: sheets }, (_, at) => part(`worksheets/sheet${at + 1}`, 'worksheet'));
  return `<Types xmlns="${PACKAGE}/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>${part('workbook', 'sheet.main')}${part('styles', 'styles')}${all.join('')}</Types>`;
}

function relations(all: readonly (readonly [type: string, target: string])[]): string {
  const one = ([type, target]: readonly [string, string], at: number): string => `<Relationship Id="rId${at + 1}" Type="${OFFICE}/${type}" Target="${target}"/>`;
  return `<Relationships xmlns="${PACKAGE}/relationships">${all.map(one).join('')}</Relationships>`;
}

function workbook(pages: readonly SheetPage[]): string {
  const sheets = pages.map(({ name }, at) => `<sheet name="${xmlText(name)}" sheetId="${at + 1}" r:id="rId${at + 1}"/>`);
  return `<workbook xmlns="${MAIN}" xmlns:r="${OFFICE}"><sheets>${sheets.join('')}</sheets><calcPr fullCalcOnLoad="1"/></workbook>`;
}

/** Decimals up to this are kept in sight as typed, trailing zeros too. */
const MOST_DECIMALS = 15;
const LOOKS: readonly Look[] = ['plain', 'head', 'quiet', 'wrapped', 'typed'];
const FIRST_FORMAT = 164;

function styles(): string {
  const decimals = Array.from({ length: MOST_DECIMALS }, (_, at) => at + 1);
  const formats = decimals.map((count, at) => `<numFmt numFmtId="${FIRST_FORMAT + at}" formatCode="0.${'0'.repeat(count)}"/>`);
  const plain = (font: number, fill = 0, more = ''): string => `<xf numFmtId="0" fontId="${font}" fillId="${fill}" borderId="0" xfId="0"${more ? ` applyAlignment="1"><alignment ${more}/></xf>` : '/>'}`;
  const typed = decimals.map((_, at) => `<xf numFmtId="${FIRST_FORMAT + at}" fontId="0" fillId="2" borderId="0" xfId="0" applyNumberFormat="1"/>`);
  // a text that looks like a formula stays one when it is edited
  const quoted = '<xf numFmtId="49" fontId="0" fillId="2" borderId="0" xfId="0" quotePrefix="1" applyNumberFormat="1"/>';
  const formatted = [plain(0), plain(1, 0, 'wrapText="1" vertical="top"'), plain(2), plain(0, 0, 'wrapText="1" vertical="top"'), plain(0, 2), ...typed, quoted];
  const font = (more: string): string => `<font>${more}<sz val="11"/><name val="Calibri"/></font>`;
  const fill = (inner: string): string => `<fill><patternFill ${inner}</fill>`;
  return `<styleSheet xmlns="${MAIN}"><numFmts count="${formats.length}">${formats.join('')}</numFmts>`
    + `<fonts count="3">${font('')}${font('<b/>')}<font><sz val="11"/><color rgb="FF767676"/><name val="Calibri"/></font></fonts>`
    + `<fills count="3">${fill('patternType="none"/>')}${fill('patternType="gray125"/>')}${fill('patternType="solid"><fgColor rgb="FFFFF8E1"/></patternFill>')}</fills>`
    + `<borders count="1"><border/></borders><cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs>`
    + `<cellXfs count="${formatted.length}">${formatted.join('')}</cellXfs></styleSheet>`;
}

function styleOf(cell: NonNullable<Cell>): number {
  const look = LOOKS.indexOf(cell.look);
  if (cell.kind === 'text' && guardedText(cell.text) !== cell.text) return LOOKS.length + MOST_DECIMALS;
  if (cell.kind !== 'number' || cell.look !== 'typed') return look;
  return look + Math.min(MOST_DECIMALS, cell.text.split('.')[1]?.length ?? 0);
}

function sheet({ rows, widths, frozen }: SheetPage): string {
  const columns = widths.map((width, at) => `<col min="${at + 1}" max="${at + 1 === widths.length ? 16384 : at + 1}" width="${width}" customWidth="1"/>`);
  const { columns: x, rows: y } = frozen;
  const pane = x || y ? `<pane${x ? ` xSplit="${x}"` : ''}${y ? ` ySplit="${y}"` : ''} topLeftCell="${address(x, y)}" activePane="${x && y ? 'bottomRight' : y ? 'bottomLeft' : 'topRight'}" state="frozen"/>` : '';
  return `<worksheet xmlns="${MAIN}"><sheetPr><outlinePr summaryBelow="0"/></sheetPr><sheetViews><sheetView workbookViewId="0">${pane}</sheetView></sheetViews>`
    + `<sheetFormatPr defaultRowHeight="15" outlineLevelRow="1"/>${columns.length ? `<cols>${columns.join('')}</cols>` : ''}<sheetData>${rows.map(row).join('')}</sheetData></worksheet>`;
}

function row({ cells, hidden = false }: SheetRow, at: number): string {
  return `<row r="${at + 1}"${hidden ? ' outlineLevel="1" hidden="1"' : ''}>${cells.map((one, column) => written(one, address(column, at))).join('')}</row>`;
}

function written(cell: Cell, at: string): string {
  if (!cell) return '';
  const place = `r="${at}" s="${styleOf(cell)}"`;
  switch (cell.kind) {
    case 'blank':
      return `<c ${place}/>`;
    case 'text':
      return `<c ${place} t="inlineStr"><is><t xml:space="preserve">${cellText(cell.text)}</t></is></c>`;
    case 'number':
      return `<c ${place}><v>${doubleText(new Decimal(cell.text))}</v></c>`;
    case 'formula': {
      const { cached } = cell;
      const [type, value] = typeof cached === 'string' ? [' t="str"', cellText(cached)] : ['', doubleText(cached)];
      return `<c ${place}${type}><f>${xmlText(cell.formula)}</f><v>${value}</v></c>`;
    }
  }
}

/** The double that a sheet holds, in the fewest digits that give it back. */
const doubleText = (value: Decimal): string => String(value.toNumber()).replace('e', 'E');
