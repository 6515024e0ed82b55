import { describe, expect, it } from 'vitest';
import type { ScreenWellRow } from '@/contracts/screens';
import { inPlateOrder, placeOf, plateMaps, wellBeside } from '@/islands/screen/plates';

function well(position: string, more: Partial<ScreenWellRow> = {}): ScreenWellRow {
  return {
    wellId: `${more.plate ?? 'Plate 1'} ${position}`,
    plate: 'Plate 1',
    position,
    catalyst: 'K1',
    catalystId: 'k1',
    role: 'sample',
    temperatureK: 333.15,
    readings: 20,
    verdict: 'first',
    conversion: 0.5,
    ...more,
  };
}

describe('the place of a well', () => {
  it('counts rows from A and columns from 1', () => {
    expect(placeOf('A01')).toEqual({ row: 0, column: 0 });
    expect(placeOf('P24')).toEqual({ row: 15, column: 23 });
  });

  it.each(['A25', 'Q01', 'A00', 'tube 3', ''])('is none for %s', (name) => {
    expect(placeOf(name)).toBeNull();
  });
});

describe('the order of wells', () => {
  it('goes along the rows, plate by plate, with numbers as numbers', () => {
    const wells = [
      well('A01', { plate: 'Plate 10' }),
      well('B01'),
      well('A11'),
      well('tube 3'),
      well('A02'),
      well('A01', { plate: 'Plate 2' }),
    ];
    expect(inPlateOrder(wells).map(({ plate, position }) => `${plate} ${position}`)).toEqual([
      'Plate 1 A02',
      'Plate 1 A11',
      'Plate 1 B01',
      'Plate 1 tube 3',
      'Plate 2 A01',
      'Plate 10 A01',
    ]);
  });
});

describe('the map of a plate', () => {
  it.each([
    ['D06', 4, 6],
    ['D07', 6, 8],
    ['H12', 8, 12],
    ['A13', 16, 24],
  ])('is the smallest plate that holds %s', (position, rows, columns) => {
    expect(plateMaps([well(position)])[0]).toMatchObject({ rows, columns });
  });

  it('puts each well where it lay and leaves the rest empty', () => {
    const [map] = plateMaps([well('B03'), well('C01')]);
    expect(map?.wells[1]?.[2]?.position).toBe('B03');
    expect(map?.wells[2]?.[0]?.position).toBe('C01');
    expect(map?.wells.flat().filter((one) => one !== null)).toHaveLength(2);
  });

  it('names one temperature only where there is one', () => {
    expect(
      plateMaps([well('A01'), well('A02', { temperatureK: 333.35 })])[0]?.temperatureK,
    ).toBeCloseTo(333.25, 6);
    expect(
      plateMaps([well('A01'), well('A02', { temperatureK: 343.15 })])[0]?.temperatureK,
    ).toBeNull();
  });

  it('is left out for a plate with names that are no place', () => {
    const maps = plateMaps([well('tube 3'), well('A01', { plate: 'Plate 2' })]);
    expect(maps.map(({ plate }) => plate)).toEqual(['Plate 2']);
  });
});

describe('arrow keys on a plate', () => {
  const [map] = plateMaps([well('A01'), well('A04'), well('C04')]);
  const go = (from: string, key: string) => wellBeside(map!, `Plate 1 ${from}`, key)?.position;

  it('pass over empty places to the next filled one', () => {
    expect(go('A01', 'ArrowRight')).toBe('A04');
    expect(go('A04', 'ArrowDown')).toBe('C04');
    expect(go('C04', 'ArrowUp')).toBe('A04');
  });

  it('stay where there is nothing further, and leave other keys alone', () => {
    expect(go('A01', 'ArrowLeft')).toBeUndefined();
    expect(go('A01', 'ArrowDown')).toBeUndefined();
    expect(go('A01', 'Enter')).toBeUndefined();
  });
});
