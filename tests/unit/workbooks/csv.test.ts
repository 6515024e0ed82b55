import { describe, expect, it } from 'vitest';
import { writeCsv } from '@/workbooks/writeCsv';
import { issuesOf, screenOf, summary, text } from '../../fixtures/workbooks';

const HEADER = ['well', 'catalyst', 'T / °C', 'm / mg', 'V / mL', 'role', 't / min', 'c / mmol/L'];
const ROWS = [
  ['A1', 'MB-01', '60,5', '5', '2', 'sample', '0', '4,5'],
  ['A1', 'MB-01', '60,5', '5', '2', 'sample', '5', '3,1'],
];

const table = (delimiter: string, decimal: ',' | '.', rows = ROWS) =>
  [HEADER, ...rows.map((row) => row.map((field) => field.replace(/(\d),(\d)/u, `$1${decimal}$2`)))]
    .map((row) => row.join(delimiter))
    .join('\r\n');

const read = (content: string) => screenOf(text(content), 'a.csv');

describe('delimiters and decimal signs', () => {
  it.each([
    [',', '.'],
    [';', '.'],
    [';', ','],
    ['\t', '.'],
    ['\t', ','],
  ] as const)('reads fields between %j with the decimal sign %j', async (delimiter, decimal) => {
    const screen = await read(table(delimiter, decimal));
    expect(screen.wells[0]).toMatchObject({ temperatureK: 60.5 + 273.15, massG: 0.005 });
    expect(screen.wells[0]!.readings).toMatchObject({
      timesS: [0, 300],
      values: [0.0045, 0.0031],
    });
  });

  it('never makes 3005 of 300,5', async () => {
    const issues = await issuesOf(text(table(',', '.').replace('3.1', '"300,5"')), 'a.csv');
    expect(issues.map(summary)).toContain('stop decimal-sign csv!H3');
  });

  it('stops when 1.234 may be a thousand or a fraction', async () => {
    const rows = ROWS.map((row) =>
      row.map((field, at) => (at === 7 ? '1.234' : field === '60,5' ? '60' : field)),
    );
    const issues = await issuesOf(text(table(';', '.', rows)), 'a.csv');
    expect(issues.map(summary)).toContain('stop decimal-sign-unclear csv!H2');
  });

  it('stops for a decimal point in a file of decimal commas', async () => {
    const issues = await issuesOf(text(table(';', ',').replace('3,1', '3.1')), 'a.csv');
    expect(issues.map(summary)).toContain('stop decimal-sign csv!H3');
  });

  it('takes 0012, 1-2 and 1/2 as they are written', async () => {
    const screen = await read(table(',', '.').replaceAll('MB-01', '0012'));
    expect(screen.wells[0]!.catalyst).toBe('0012');
    const dated = await read(table(',', '.').replaceAll('MB-01', '1-2'));
    expect(dated.wells[0]!.catalyst).toBe('1-2');
  });

  it('follows a first line sep=; and keeps row numbers right', async () => {
    const screen = await read(`sep=;\r\n${table(';', ',')}`);
    expect(screen.wells[0]!.readings.rows).toEqual([3, 4]);
  });
});

describe('encodings', () => {
  const utf16 = (content: string) => Buffer.from(`\ufeff${content}`, 'utf16le');

  it.each([
    ['a byte order mark', Buffer.from(`\ufeff${table(',', '.')}`)],
    ['UTF-16', utf16(table('\t', '.'))],
    ['UTF-16 without a mark', utf16(table('\t', '.')).subarray(2)],
    ['big-endian UTF-16', Buffer.from(utf16(table('\t', '.'))).swap16()],
  ])('reads %s', async (_what, bytes) => {
    expect((await screenOf(bytes, 'a.csv')).wells[0]!.temperatureK).toBe(333.65);
  });

  it('reads Western European bytes with a caution', async () => {
    const screen = await screenOf(Buffer.from(table(',', '.'), 'latin1'), 'a.csv');
    expect(screen.cautions.map((caution) => caution.code)).toEqual(['encoding-guessed']);
  });
});

describe('faults of the table', () => {
  const issuesFor = async (content: string) =>
    (await issuesOf(text(content), 'a.csv')).map(summary);

  it('stops for a row with a field too many or too few, at its place', async () => {
    expect(await issuesFor(`${table(',', '.')}\r\nA1,MB-01,60.5,5,2,sample,9,1.5,extra`)).toContain(
      'stop ragged-row csv!I4',
    );
    expect(await issuesFor(`${table(',', '.')}\r\nA1,MB-01,60.5,5`)).toContain(
      'stop ragged-row csv!E4',
    );
  });

  it('stops when two rows of a well disagree, naming both cells', async () => {
    const content = table(',', '.').replace('60.5,5,2,sample,5', '61,5,2,sample,5');
    const [issue] = await issuesOf(text(content), 'a.csv');
    expect(issue).toMatchObject({
      code: 'well-disagrees',
      cell: 'C3',
      found: '61',
      expected: '60.5',
    });
    expect(issue!.message).toContain('C2');
  });

  it('takes 5 and 5.0 as the same', async () => {
    const content = table(',', '.').replace('60.5,5,2,sample,5', '60.50,5.0,2,sample,5');
    expect((await read(content)).wells).toHaveLength(1);
  });

  it('keeps the wells of two plates apart', async () => {
    const lines = table(',', '.').split('\r\n');
    const plates = [`plate,${lines[0]}`, `P1,${lines[1]}`, `P2,${lines[2]!.replace('60.5', '70')}`];
    const screen = await read(plates.join('\n'));
    expect(screen.plates.map((plate) => plate.name)).toEqual(['P1', 'P2']);
    expect(screen.wells.map((well) => well.temperatureK)).toEqual([333.65, 343.15]);
  });

  it('stops for a missing plate name', async () => {
    const lines = table(',', '.').split('\r\n');
    const content = [`plate,${lines[0]}`, `P1,${lines[1]}`, `,${lines[2]}`].join('\n');
    expect(await issuesFor(content)).toEqual(['stop plate-missing csv!A3']);
  });

  it('stops for a NUL inside a text', async () => {
    expect(await issuesFor(table(',', '.').replace('MB-01', 'MB\u0000'))).toContain(
      'stop control-character csv!B2',
    );
  });
});

describe('writing csv', () => {
  it('never writes what a spreadsheet would calculate', () => {
    const lines = writeCsv([
      ['=1+1', '+A1', '-A1', '@x', '\tx', '＝1', '-5', 'a"b', -5, NaN, null],
    ]);
    expect(lines).toBe(`"'=1+1","'+A1","'-A1","'@x","'\tx","'＝1","-5","a""b",-5,,\r\n`);
  });

  it('reads back what it wrote', async () => {
    const content = writeCsv([
      ['well', 'catalyst', 'T / °C', 't / min', 'c / mmol/L'],
      ['A1', '=HYPERLINK("x")', 60, 0, 4],
      ['A1', '=HYPERLINK("x")', 60, 5, 3],
    ]);
    expect((await read(content)).wells[0]!.catalyst).toBe('=HYPERLINK("x")');
  });
});
