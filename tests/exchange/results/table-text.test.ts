import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { asCsv, asHtmlTable, asTsv, chosenMark, guardedText } from '../../../src/exchange/results/table-text.js';
import type { ResultCell } from '../../../src/exchange/results/row.js';

const text = (of: string): ResultCell => ({ kind: 'text', text: of });
const number = (of: string): ResultCell => ({ kind: 'number', text: of });
const EMPTY: ResultCell = { kind: 'empty', text: '' };

describe('a text in a sheet', () => {
  // OWASP, “CSV Injection” (from memory): cells that begin with = + - @ tab, carriage return or line feed, and the
  // full-width forms of the signs; the payloads are the usual ones of such lists
  it.each([
    '=1+1', '+1', '-1', '@SUM(A1)', '\t=1', '\r=1', '\n=1', '\uff1d1+1', '\uff0b1', '\uff0d1', '\uff20A1',
    '=cmd|\' /C calc\'!A0', '=HYPERLINK("http://x","y")', '+cmd|\' /C calc\'!A0', '-2+3+cmd|\' /C calc\'!A0', '@SUM(1+1)*cmd|\' /C calc\'!A0', '=DDE("cmd";"/C calc";"x")',
    '  =1+1', '\u00a0=1', '\u200b=1', '\ufeff=1', '\u0000=1', '\u2212 1',
  ])('%j is never a formula', (payload) => {
    expect(guardedText(payload)).toBe(`'${payload}`);
    for (const out of [asTsv([[text(payload)]], '.'), asCsv([[text(payload)]], { mark: ',', delimiter: ';' })]) {
      expect(out.replace(/^"/, '').startsWith('\'')).toBe(true);
    }
    expect(asHtmlTable([[text(payload)]], '.')).toMatch(/<td>&#39;/);
  });

  it.each(['Drum 4', 'a=b', 'x-1', '3+1', 'ünïcode 🛢️', 'مطعم', ''])('%j stays as it is', (harmless) => {
    expect(guardedText(harmless)).toBe(harmless);
  });

  it('no separator or quotation mark lets the rest of a text begin a cell of its own', () => {
    const row = [text('a";=1+1;"b'), text('c\r\n=2'), text('d\t=3')];
    expect(asCsv([row], { mark: ',', delimiter: ';' })).toBe('"a"";=1+1;""b";"c\r\n=2";"d\t=3"\r\n');
    expect(asTsv([row], '.')).toBe('"a"";=1+1;""b"\t"c\r\n=2"\t"d\t=3"\r\n');
  });
});

describe('a table as text', () => {
  it('keeps numbers numbers, negative ones too, with the mark of the sheet', () => {
    const row = [number('-0.40'), number('12345.60'), EMPTY, text('x')];
    expect(asTsv([row], ',')).toBe('-0,40\t12345,60\t\tx\r\n');
    expect(asCsv([row], { mark: '.', delimiter: ',' })).toBe('-0.40,12345.60,,x\r\n');
    // a decimal comma between commas is quoted
    expect(asCsv([row], { mark: ',', delimiter: ',' })).toBe('"-0,40","12345,60",,x\r\n');
    expect(asCsv([row], { mark: ',', delimiter: ';', byteOrderMark: true })).toBe('\ufeff-0,40;12345,60;;x\r\n');
    expect(asHtmlTable([row], ',')).toBe('<meta charset="utf-8"><table><tbody><tr><td align="right">-0,40</td><td align="right">12345,60</td><td></td><td>x</td></tr></tbody></table>');
  });

  it('takes the mark of the page or of the sheet', () => {
    expect([chosenMark('page', 'de'), chosenMark('page', 'en-US'), chosenMark('point', 'de'), chosenMark('comma', 'en')]).toEqual([',', '.', '.', ',']);
  });

  it('of no rows is empty', () => {
    expect([asTsv([], '.'), asCsv([], { mark: '.', delimiter: ',' })]).toEqual(['', '']);
  });

  it('as HTML holds no markup of a text', () => {
    expect(asHtmlTable([[text('<img src=x onerror=alert(1)>&"\'')]], '.')).toContain('<td>&lt;img src=x onerror=alert(1)&gt;&amp;&quot;&#39;</td>');
    expect(asHtmlTable([[text('a\r\nb\rc\u0000')]], '.')).toContain('<td>a<br>b<br>c\ufffd</td>');
  });

  it('is read back as it was, whatever the texts (RFC 4180, read by hand)', () => {
    fc.assert(fc.property(fc.array(fc.array(fc.string({ unit: 'binary' }), { minLength: 2, maxLength: 4 }), { maxLength: 4 }), (rows) => {
      const csv = asCsv(rows.map((row) => row.map(text)), { mark: '.', delimiter: ';' });
      expect(readCsv(csv, ';')).toEqual(rows.map((row) => row.map(guardedText)));
    }));
  });
});

/** Reads a file after RFC 4180, as its grammar has it. */
function readCsv(csv: string, delimiter: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let at = 0;
  while (at < csv.length) {
    let field = '';
    if (csv[at] === '"') {
      for (at++; csv[at] !== '"' || csv[at + 1] === '"'; at++) {
        if (csv[at] === '"') at++;
        field += csv[at];
      }
      at++;
    } else while (csv[at] !== delimiter && csv.slice(at, at + 2) !== '\r\n') field += csv[at++];
    row.push(field);
    if (csv[at] === delimiter) at++;
    else {
      rows.push(row);
      row = [];
      at += 2;
    }
  }
  return rows;
}
