/** The quantities a column header can name a unit of. */
export type Quantity =
  'temperature' | 'time' | 'mass' | 'volume' | 'concentration' | 'pressure' | 'ratio';

/** A recognised unit: base value = (written value + offset) · factor. */
export interface Unit {
  quantity: Quantity;
  /** As shown to people, such as `mmol/L`. */
  symbol: string;
  factor: number;
  offset: number;
}

/** Base units: K, s, g, L, mol/L, Pa, 1. Each row: symbol, factor, further spellings. */
const TABLE: Record<Quantity, [symbol: string, factor: number, ...spellings: string[]][]> = {
  temperature: [
    ['°C', 1, 'C', 'degC', 'deg.C', 'celsius', 'grdC', 'ºC'],
    ['K', 1, 'kelvin'],
  ],
  time: [
    ['s', 1, 'sec', 'secs', 'second', 'seconds'],
    ['ms', 1e-3, 'millisecond', 'milliseconds'],
    ['min', 60, 'mins', 'minute', 'minutes'],
    ['h', 3600, 'hr', 'hrs', 'hour', 'hours'],
    ['d', 86400, 'day', 'days'],
  ],
  mass: [
    ['g', 1, 'gram', 'grams'],
    ['mg', 1e-3, 'milligram', 'milligrams'],
    ['µg', 1e-6, 'ug', 'microgram', 'micrograms'],
    ['kg', 1e3],
  ],
  volume: [
    ['L', 1, 'l', 'liter', 'litre', 'liters', 'litres', 'dm3'],
    ['mL', 1e-3, 'ml', 'milliliter', 'millilitre', 'cm3', 'cc'],
    ['µL', 1e-6, 'uL', 'µl', 'microliter', 'microlitre', 'mm3'],
  ],
  concentration: [
    ['mol/L', 1, 'M', 'mol/dm3', 'molL-1', 'moldm-3', 'kmol/m3', 'mol/l', 'molar'],
    ['mmol/L', 1e-3, 'mM', 'mmol/dm3', 'mmolL-1', 'mmoldm-3', 'mol/m3', 'molm-3', 'mmol/l'],
    ['µmol/L', 1e-6, 'µM', 'uM', 'umol/L', 'µmol/dm3', 'µmolL-1', 'umolL-1', 'mmol/m3'],
    ['nmol/L', 1e-9, 'nM', 'nmolL-1'],
    ['mol/mL', 1e3, 'molmL-1'],
  ],
  pressure: [
    ['Pa', 1, 'pascal'],
    ['hPa', 100],
    ['kPa', 1e3],
    ['MPa', 1e6],
    ['mbar', 100],
    ['bar', 1e5],
    ['atm', 101_325],
    ['torr', 101_325 / 760],
    ['mmHg', 133.322_387_415],
  ],
  ratio: [
    ['%', 0.01, 'percent', 'pct', '%conversion'],
    ['1', 1, 'fraction', '-', 'mol/mol', 'a.u.', 'au', 'arb.u.', 'arb.units', 'counts', 'mAU'],
  ],
};

/** Spellings whose other case is another unit by a large factor: these are taken literally. */
const CASE_BOUND = new Set(['MPa', 'M']);

interface Spelling {
  text: string;
  unit: Unit;
  exactOnly: boolean;
}

const SPELLINGS: Spelling[] = (Object.keys(TABLE) as Quantity[]).flatMap((quantity) =>
  TABLE[quantity].flatMap(([symbol, factor, ...others]) => {
    const offset = symbol === '°C' ? 273.15 : 0;
    const unit: Unit = { quantity, symbol, factor, offset };
    return [symbol, ...others].map((text) => ({
      text: normaliseUnit(text),
      unit,
      exactOnly: CASE_BOUND.has(text),
    }));
  }),
);

/**
 * The unit a text names, or null. Case is taken as written first; another case is accepted where
 * it cannot mean another unit. `quantities` limits the answer, so that `C` is °C beside a
 * temperature and `M` is mol/L beside a concentration.
 */
export function findUnit(text: string, quantities?: readonly Quantity[]): Unit | null {
  const wanted = normaliseUnit(text);
  if (wanted === '') return null;
  const allowed = SPELLINGS.filter(
    (spelling) => quantities === undefined || quantities.includes(spelling.unit.quantity),
  );
  const exact = allowed.find((spelling) => spelling.text === wanted);
  if (exact) return exact.unit;
  const lower = wanted.toLowerCase();
  const loose = allowed.filter(
    (spelling) => !spelling.exactOnly && spelling.text.toLowerCase() === lower,
  );
  const [first] = loose;
  return first !== undefined && loose.every((spelling) => spelling.unit === first.unit)
    ? first.unit
    : null;
}

/** Spellings a person may write for a quantity, for messages. */
export function unitSymbols(quantity: Quantity): string {
  return TABLE[quantity].map(([symbol]) => symbol).join(', ');
}

/** Folds superscripts, minus signs, µ, middle dots, carets and spaces into one spelling. */
function normaliseUnit(text: string): string {
  return text
    .replace(/[⁻−–]/gu, '-')
    .normalize('NFKC')
    .replace(/[μµ]/gu, 'µ')
    .replace(/[·⋅*^\s]/gu, '');
}

/** Converts a written number to the base unit. */
export function toBase(value: number, unit: Unit): number {
  if (unit.offset !== 0) return value + unit.offset;
  // Dividing by a whole number keeps 5 mg at exactly 0.005, where multiplying by 0.001 may not.
  const inverse = 1 / unit.factor;
  return unit.factor < 1 && Number.isInteger(Math.round(inverse)) && isNearInteger(inverse)
    ? value / Math.round(inverse)
    : value * unit.factor;
}

function isNearInteger(value: number): boolean {
  return Math.abs(value - Math.round(value)) < 1e-6 * value && value < 1e12;
}
