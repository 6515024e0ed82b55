import * as XLSX from 'xlsx';
import { describe, expect, it } from 'vitest';
import { DEFAULT_LIMITS } from '@/workbooks/limits';
import {
  CFB,
  goodRows,
  issuesOf,
  repacked,
  screenOf,
  summary,
  text,
  xlsxOf,
} from '../../fixtures/workbooks';

const good = () => xlsxOf(goodRows().wells, goodRows().readings);
const SHEET2 = 'xl/worksheets/sheet2.xml';

/** An OLE container that holds the stream of an encrypted workbook. */
function encryptedWorkbook(): Uint8Array {
  const container = CFB.utils.cfb_new();
  CFB.utils.cfb_add(container, '/EncryptedPackage', Buffer.from('secret'));
  return new Uint8Array(CFB.write(container, { type: 'buffer' }));
}

/** The good workbook with the encryption bit set in every zip header. */
function encryptedZip(): Uint8Array {
  const bytes = Buffer.from(good());
  for (
    let at = bytes.indexOf('PK\u0001\u0002');
    at >= 0;
    at = bytes.indexOf('PK\u0001\u0002', at + 4)
  ) {
    bytes[at + 8]! |= 1;
  }
  return bytes;
}

function renamed(from: string, to: string): Uint8Array {
  const bytes = Buffer.from(good());
  for (let at = bytes.indexOf(from); at >= 0; at = bytes.indexOf(from, at + 1)) bytes.write(to, at);
  return bytes;
}

const legacy = () => {
  const book = XLSX.utils.book_new();
  XLSX.utils.book_append_sheet(book, XLSX.utils.aoa_to_sheet(goodRows().wells), 'Wells');
  return (bookType: XLSX.BookType) =>
    new Uint8Array(XLSX.write(book, { type: 'array', bookType }) as ArrayBuffer);
};

const REFUSED: [what: string, bytes: () => Uint8Array, name: string, code: string][] = [
  ['an empty file', () => text(''), 'a.xlsx', 'empty-file'],
  ['a file of blanks', () => text(' \n \n'), 'a.csv', 'empty-file'],
  [
    'a PNG',
    () => new Uint8Array([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 13]),
    'a.xlsx',
    'not-a-workbook',
  ],
  ['a PDF', () => text('%PDF-1.7\n'), 'a.xlsx', 'not-a-workbook'],
  [
    'a web page',
    () => text('<html><table><tr><td>well</td></tr></table></html>'),
    'a.xlsx',
    'not-a-workbook',
  ],
  ['a web page named csv', () => text('<!DOCTYPE html><p>well</p>'), 'a.csv', 'not-a-workbook'],
  ['text named xlsx', () => text('well,t / min,c / mmol/L\nA1,0,1\n'), 'a.xlsx', 'not-a-workbook'],
  ['prose named csv', () => text('Dear all,\nthe plate is ready.\n'), 'a.csv', 'no-layout'],
  ['a truncated zip', () => good().subarray(0, 9000), 'a.xlsx', 'broken-zip'],
  ['half a header', () => text('PK\u0003\u0004'), 'a.xlsx', 'broken-zip'],
  ['an encrypted workbook', encryptedWorkbook, 'a.xlsx', 'encrypted'],
  ['an encrypted zip', encryptedZip, 'a.xlsx', 'encrypted'],
  ['an older .xls', () => legacy()('biff8'), 'a.xls', 'legacy-workbook'],
  ['an .xlsb', () => legacy()('xlsb'), 'a.xlsb', 'not-a-workbook'],
  ['an .ods', () => legacy()('ods'), 'a.ods', 'not-a-workbook'],
  [
    'a part outside the container',
    () => renamed('docProps/app.xml', '../../../app.xml'),
    'a.xlsx',
    'odd-part-name',
  ],
  [
    'a document type',
    () => repacked({ [SHEET2]: (xml) => xml.replace('?>', '?><!DOCTYPE a [<!ENTITY b "c">]>') }),
    'a.xlsx',
    'document-type',
  ],
  [
    'a bomb',
    () => repacked({ 'xl/media/zeros.bin': '\0'.repeat(5_000_000) }),
    'a.xlsx',
    'inflates-too-far',
  ],
  ['a far row', () => repacked({ [SHEET2]: farCell('A1048576') }), 'a.xlsx', 'beyond-limit'],
  ['a far column', () => repacked({ [SHEET2]: farCell('XFD20') }), 'a.xlsx', 'beyond-limit'],
];

function farCell(address: string) {
  const row = /\d+$/u.exec(address)![0];
  return (xml: string) =>
    xml.replace('</sheetData>', `<row r="${row}"><c r="${address}"><v>7</v></c></row></sheetData>`);
}

describe('files that are refused as a whole', () => {
  it.each(REFUSED)('%s', async (_what, bytes, name, code) => {
    const issues = await issuesOf(bytes(), name);
    expect(issues.filter((issue) => issue.severity === 'stop').map((issue) => issue.code)).toEqual([
      code,
    ]);
    expect(issues[0]!.message).toMatch(/\.$/u);
  });

  it('says what to save as, or what to remove', async () => {
    const message = async (bytes: Uint8Array) => (await issuesOf(bytes))[0]!.message;
    expect(await message(encryptedWorkbook())).toContain('Remove the password');
    expect(await message(legacy()('xlsb'))).toContain('.xlsx');
    expect(await message(legacy()('biff8'))).toContain('.xlsx');
  });

  it('refuses too many parts, too many rows and too large a file', async () => {
    const limits = (change: Partial<typeof DEFAULT_LIMITS>) => ({ ...DEFAULT_LIMITS, ...change });
    const codes = async (change: Partial<typeof DEFAULT_LIMITS>) =>
      (await issuesOf(good(), 'a.xlsx', limits(change))).map((issue) => issue.code);
    expect(await codes({ zipEntries: 5 })).toEqual(['too-many-parts']);
    expect(await codes({ fileBytes: 100 })).toEqual(['too-large']);
    expect(await codes({ rows: 8 })).toEqual(['beyond-limit']);
    expect(await codes({ totalBytes: 3000 })).toEqual(['inflates-too-far']);
  });

  it('stops a bomb early, without holding what it unpacks to', async () => {
    const bomb = repacked({ 'xl/media/zeros.bin': '\0'.repeat(120_000_000) });
    const before = process.memoryUsage().rss;
    await issuesOf(bomb);
    expect(process.memoryUsage().rss - before).toBeLessThan(50e6);
  });
});

describe('odd files that are read all the same', () => {
  it('reads every row whatever the stated dimension', async () => {
    for (const stated of ['A1:XFD1048576', 'A1:A1']) {
      const bytes = repacked({
        [SHEET2]: (xml) => xml.replace(/<dimension ref="[^"]*"/u, `<dimension ref="${stated}"`),
      });
      const screen = await screenOf(bytes);
      expect(screen.wells.map((well) => well.readings.values.length)).toEqual([3, 3, 3]);
    }
  });

  it('does not count a styled empty cell in the last row as data', async () => {
    const bytes = repacked({
      [SHEET2]: (xml) =>
        xml.replace('</sheetData>', '<row r="1048576"><c r="A1048576" s="0"/></row></sheetData>'),
    });
    expect((await screenOf(bytes)).wells).toHaveLength(3);
  });

  it('ignores macros and links to other files, and says so', async () => {
    const bytes = repacked({
      'xl/vbaProject.bin': 'macro',
      'xl/externalLinks/externalLink1.xml': '<externalLink/>',
    });
    expect((await screenOf(bytes)).cautions.map(summary)).toEqual([
      'caution macros-ignored screen.xlsx!',
      'caution external-links screen.xlsx!',
    ]);
  });

  it('stops for a formula without a stored result', async () => {
    const bytes = repacked({
      [SHEET2]: (xml) => xml.replace(/<c r="C3"><v>3<\/v><\/c>/u, '<c r="C3"><f>1+2</f></c>'),
    });
    expect((await issuesOf(bytes)).map(summary)).toEqual(['stop not-calculated Readings!C3']);
  });

  it('tells the format from the content, not the name', async () => {
    expect((await screenOf(good(), 'screen.csv')).wells).toHaveLength(3);
  });
});
