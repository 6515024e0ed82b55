import type { ReadingDimension, ReadingKind } from '../kinetics/types';
import { findUnit, type Quantity, type Unit } from './units';

export type ColumnKey =
  | 'well'
  | 'plate'
  | 'plateFormat'
  | 'catalyst'
  | 'temperature'
  | 'measuredTemperature'
  | 'mass'
  | 'volume'
  | 'role'
  | 'replicate'
  | 'time'
  | 'reading';

/** What a reading column follows, as far as its name says. */
export type ReadingName = ReadingKind | 'total-pressure' | 'unnamed';

/** A header cell whose meaning is known. */
export interface Header {
  key: ColumnKey;
  text: string;
  /** The unit as written; null when the header names none. */
  unitText: string | null;
  /** Null when there is none or it is not known for this quantity. */
  unit: Unit | null;
  /** Only for `reading`. */
  readingName: ReadingName | null;
}

/** Words a header may use for each column, lower case, without punctuation. */
const NAMES: Record<ColumnKey, readonly string[]> = {
  well: ['well', 'wells', 'well position', 'position', 'well id', 'well no', 'pos'],
  plate: ['plate', 'plate name', 'plate id', 'plate no', 'plate number'],
  plateFormat: ['plate format', 'format', 'plate size', 'wells per plate'],
  catalyst: ['catalyst', 'catalyst code', 'catalyst id', 'cat', 'code'],
  temperature: ['temperature', 'temp', 'set temperature', 'nominal temperature', 't set', 'tset'],
  measuredTemperature: [
    'measured temperature',
    'well temperature',
    'actual temperature',
    'temperature measured',
    't measured',
    't meas',
    't well',
  ],
  mass: ['mass', 'm', 'catalyst mass', 'cat mass', 'm cat', 'mcat', 'weight', 'catalyst weight'],
  volume: ['volume', 'v', 'vol', 'liquid volume', 'solution volume', 'reaction volume'],
  role: ['role', 'well role', 'type', 'well type'],
  replicate: ['replicate', 'rep', 'repeat', 'replicate no', 'replicate number'],
  time: ['time', 'elapsed time', 'reaction time', 't time'],
  reading: [],
};

const READING_NAMES: Record<ReadingName, readonly string[]> = {
  reactant: [
    'c',
    'conc',
    'concentration',
    'reactant',
    'reactant concentration',
    'concentration of reactant',
    'p',
    'pressure',
    'partial pressure',
    'reactant pressure',
  ],
  product: ['product', 'product concentration', 'c product', 'concentration of product'],
  conversion: ['conversion', 'x'],
  signal: ['signal', 'absorbance', 'area', 'peak area', 'intensity'],
  'total-pressure': ['total pressure', 'p total', 'ptotal', 'p tot'],
  unnamed: ['reading', 'readings', 'value', 'measurement'],
};

const KEYS_BY_NAME = new Map<string, ColumnKey>(
  (Object.keys(NAMES) as ColumnKey[]).flatMap((key) => NAMES[key].map((name) => [name, key])),
);
const READINGS_BY_NAME = new Map<string, ReadingName>(
  (Object.keys(READING_NAMES) as ReadingName[]).flatMap((kind) =>
    READING_NAMES[kind].map((name) => [name, kind]),
  ),
);

/** The quantities whose units a column may carry; empty for columns without a unit. */
export function quantitiesOf(key: ColumnKey, readingName: ReadingName | null): Quantity[] {
  switch (key) {
    case 'temperature':
    case 'measuredTemperature':
      return ['temperature'];
    case 'mass':
    case 'volume':
    case 'time':
      return [key];
    case 'reading':
      return readingName === 'conversion' || readingName === 'signal'
        ? ['ratio']
        : ['concentration', 'pressure'];
    default:
      return [];
  }
}

/** Reads a header cell such as `T / °C`, `time [s]`, `mass (mg)`; null when it is not known. */
export function recogniseHeader(text: string): Header | null {
  const written = text.trim().replace(/\s+/gu, ' ');
  if (written === '' || written.length > 80) return null;
  for (const [name, unitText] of splits(written)) {
    const header = named(name, unitText, written);
    if (header) return header;
  }
  return null;
}

/** Ways to cut a header into name and unit, most explicit first. */
function splits(text: string): [name: string, unitText: string | null][] {
  const cuts: [string, string | null][] = [];
  const bracket = /^(.+?)\s*[([]\s*([^()[\]]+?)\s*[)\]]$/u.exec(text);
  if (bracket) cuts.push([bracket[1]!, bracket[2]!]);
  const slash = /^([^/]+?)\s*\/\s*(.+)$/u.exec(text);
  if (slash) cuts.push([slash[1]!, slash[2]!.replace(/^[([]\s*|\s*[)\]]$/gu, '')]);
  const comma = /^(.+?)(?:,| in)\s+(\S.*)$/u.exec(text);
  if (comma) cuts.push([comma[1]!, comma[2]!]);
  const percent = /^%\s*(.+)$/u.exec(text);
  if (percent) cuts.push([percent[1]!, '%']);
  cuts.push([text, null]);
  const tail = /^(.+)[\s_]+(\S+)$/u.exec(text);
  if (tail && findUnit(tail[2]!)) cuts.push([tail[1]!, tail[2]!]);
  return cuts;
}

function named(name: string, unitText: string | null, text: string): Header | null {
  const plain = name
    .normalize('NFKC')
    .replace(/[._:\-\s]+/gu, ' ')
    .trim()
    .toLowerCase();
  const readingName = READINGS_BY_NAME.get(plain) ?? null;
  const key =
    readingName === null ? (KEYS_BY_NAME.get(plain) ?? symbolT(name, unitText)) : 'reading';
  if (key === null) return null;
  const unit = unitText === null ? null : findUnit(unitText, quantitiesOf(key, readingName));
  return { key, text, unitText, unit, readingName };
}

/** The letter T is a temperature or a time: its unit says which, else its case. */
function symbolT(name: string, unitText: string | null): ColumnKey | null {
  const letter = name.trim();
  if (letter !== 't' && letter !== 'T') return null;
  if (unitText !== null && findUnit(unitText, ['temperature'])) return 'temperature';
  if (unitText !== null && findUnit(unitText, ['time'])) return 'time';
  return letter === 'T' ? 'temperature' : 'time';
}

/** Meaning of a reading column, from its name and unit. */
export interface ReadingMeaning {
  dimension: ReadingDimension;
  kind: ReadingKind;
}

/** Null when name and unit together do not say what is followed. */
export function meaningOf(readingName: ReadingName, unit: Unit | null): ReadingMeaning | null {
  if (readingName === 'total-pressure') return null;
  if (readingName === 'conversion' || readingName === 'signal') {
    return { dimension: 'ratio', kind: readingName };
  }
  if (unit === null || (unit.quantity !== 'concentration' && unit.quantity !== 'pressure')) {
    return null;
  }
  return { dimension: unit.quantity, kind: readingName === 'unnamed' ? 'reactant' : readingName };
}
