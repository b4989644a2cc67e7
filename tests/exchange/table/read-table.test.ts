import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { textOfBytes } from '../../../src/exchange/table/bytes.js';
import { readTable } from '../../../src/exchange/table/read-table.js';
import { MOST_BYTES } from '../../../src/exchange/table/table.js';
import type { Table } from '../../../src/exchange/table/table.js';

function table(text: string): Table {
  const read = readTable(text);
  if ('fault' in read) throw new Error(JSON.stringify(read.fault));
  return read;
}
const fault = (text: string): unknown => {
  const read = readTable(text);
  return 'fault' in read ? read.fault : 'no fault';
};
const codes = ({ warnings }: Table): readonly string[] => warnings.map(({ code }) => code);

// RFC 4180, section 2, rules 1 to 7, each with its own example there
describe('CSV after RFC 4180', () => {
  const bare = (text: string): readonly (readonly string[])[] => table(`Lot,FFA,Water\r\n${text}`).rows;
  it.each([
    ['1: each record on its own line', 'aaa,1,2\r\nzzz,3,4\r\n', [['aaa', '1', '2'], ['zzz', '3', '4']]],
    ['2: the last may have no line end', 'aaa,1,2\r\nzzz,3,4', [['aaa', '1', '2'], ['zzz', '3', '4']]],
    ['4: spaces belong to a field', 'a a ,1, 2', [['a a ', '1', ' 2']]],
    ['5: fields may be quoted', '"aaa","1","2"', [['aaa', '1', '2']]],
    ['6: line breaks, quotes and commas in quotes', '"aaa","1\r\nbb","c,c"', [['aaa', '1\r\nbb', 'c,c']]],
    ['7: a quote is doubled', '"a""aa",1,2', [['a"aa', '1', '2']]],
  ])('%s', (_, text, rows) => {
    expect(bare(text)).toEqual(rows);
  });
  it('3: the first line may be a header', () => {
    expect(table('Lot,FFA\r\nA,1').header).toEqual(['Lot', 'FFA']);
    expect(table('A,1\r\nB,2').header).toBeUndefined();
    expect(codes(table('A,1\r\nB,2'))).toContain('no-header');
  });
});

describe('tables of other kinds', () => {
  it('tabs as sheets copy them, with a quoted cell', () => {
    expect(table('Lot\tFFA\n"two\nlines"\t1,5').rows).toEqual([['two\nlines', '1,5']]);
    expect(table('Lot\tFFA\nA\t1').from).toBe('tsv');
  });
  it('semicolons with decimal commas', () => {
    expect(table('Partie;FFA;Wasser\nA;1,5;0,08').rows).toEqual([['A', '1,5', '0,08']]);
  });
  it('one column of decimal commas is not two columns', () => {
    const read = table('1,5\n2,25\n3,1');
    expect(read.rows).toEqual([['1,5'], ['2,25'], ['3,1']]);
    expect(codes(read)).toEqual(['one-column', 'no-header']);
  });
  it('a byte order mark and empty rows around', () => {
    const read = table('\ufeff\n\nLot;FFA\nA;1\n\n;\nB;2\n\n');
    expect(read.header).toEqual(['Lot', 'FFA']);
    expect(read.firstRow).toBe(4);
    expect(read.rows).toEqual([['A', '1'], [''], ['', ''], ['B', '2']]);
  });
  it('control characters are left out, and that is said', () => {
    const read = table('Lot\tFFA\nA\u0000\u0007B\t1\nsome more text so that it is no binary file at all, honestly\t2');
    expect(read.rows[0]).toEqual(['AB', '1']);
    expect(codes(read)).toContain('control-characters');
  });
  it('a heading twice is said', () => {
    expect(table('Lot,FFA,ffa \nA,1,2').warnings).toEqual([{ code: 'header-twice', params: { header: 'ffa' } }]);
  });
});

describe('what is no table', () => {
  it('nothing, a heading alone', () => {
    expect(fault('')).toEqual({ code: 'empty' });
    expect(fault(' \n\t\n')).toEqual({ code: 'empty' });
    expect(fault('Lot,FFA')).toEqual({ code: 'empty' });
  });
  it('a quote never closed, with its row', () => {
    expect(fault('Lot,FFA\nA,1\nB,"2\nC,3\n')).toMatchObject({ code: 'quote-never-closed' });
  });
  it('a file that is none', () => {
    expect(fault('PK\u0003\u0004\u0014\u0000\u0006')).toEqual({ code: 'binary' });
    expect(fault('%PDF-1.7 …')).toEqual({ code: 'binary' });
    expect(fault('\u0000\u0001\u0002\u0003 some bytes \u0000\u0000')).toEqual({ code: 'binary' });
  });
  it('a thousand columns', () => {
    expect(fault(Array(1000).fill('x').join('\t') + '\n')).toMatchObject({ code: 'too-many-columns', params: { columns: '1000' } });
  });
  it('more than 50 MB', () => {
    expect(fault('x'.repeat(MOST_BYTES + 1))).toEqual({ code: 'too-large', params: { most: '50' } });
  });
});

it('bytes are UTF-8, UTF-16 by their mark, else Western European', () => {
  const utf16 = new Uint8Array([0xff, 0xfe, ...[...'Öl'].flatMap((letter) => [letter.charCodeAt(0), 0])]);
  expect(textOfBytes(new TextEncoder().encode('Säure;1'))).toBe('Säure;1');
  expect(textOfBytes(utf16)).toBe('Öl');
  expect(textOfBytes(new Uint8Array([0x53, 0xe4, 0x75, 0x72, 0x65]))).toBe('Säure');
});

it('what another writer of CSV writes comes back cell by cell', () => {
  const cell = fc.string({ unit: 'grapheme-ascii', maxLength: 12 }).map((text) => text.replace(/\r/g, ''));
  fc.assert(
    fc.property(fc.array(fc.tuple(cell, cell, cell), { minLength: 1, maxLength: 8 }), fc.constantFrom(',', ';', '\t'), (rows, delimiter) => {
      const written = Papa.unparse({ fields: ['Lot', 'FFA', 'Water'], data: rows }, { delimiter });
      const read = readTable(written);
      const expected = [...rows];
      while (expected.length && expected.at(-1)!.every((one) => one.trim() === '')) expected.pop();
      if ('fault' in read) return expect(expected).toEqual([]);
      expect(read.rows.map((row) => [...row])).toEqual(expected.map((row) => [...row]));
    }),
    { numRuns: 300, seed: 3 },
  );
});
