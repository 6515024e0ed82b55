import { describe, expect, it } from 'vitest';
import type { CandidateWell } from '@/contracts/candidate';
import { firstWell, groupWells, wellBeside } from '@/islands/candidate/wellGroups';

function well(
  wellId: string,
  temperatureK: number,
  replicate: number,
  conversion: number | null = 0.5,
  verdict = 'first',
): CandidateWell {
  return {
    wellId,
    temperatureK,
    replicate,
    plate: 'Plate 1',
    position: wellId,
    analysis: { conversion, verdict },
  } as unknown as CandidateWell;
}

const wells = [
  well('C1', 333.15, 1),
  well('A2', 313.25, 2),
  well('A1', 313.05, 1),
  well('C2', 333.15, 2, 0.9),
  well('B1', 323.15, 1, 1, 'unusable'),
];
const groups = groupWells(wells);

describe('wells by temperature', () => {
  it('go from cold to hot, replicates in order, tenths of a degree together', () => {
    expect(groups.map((group) => group.wells.map(({ wellId }) => wellId))).toEqual([
      ['A1', 'A2'],
      ['B1'],
      ['C1', 'C2'],
    ]);
    expect(groups[0]?.temperatureK).toBeCloseTo(313.15, 9);
  });
});

describe('arrow keys among wells', () => {
  it('go across temperatures and among replicates', () => {
    expect(wellBeside(groups, 'A1', 'ArrowDown')).toBe('A2');
    expect(wellBeside(groups, 'A2', 'ArrowRight')).toBe('B1');
    expect(wellBeside(groups, 'C2', 'ArrowLeft')).toBe('B1');
    expect(wellBeside(groups, 'B1', 'Home')).toBe('A1');
    expect(wellBeside(groups, 'A1', 'End')).toBe('C2');
  });

  it('stop at the ends', () => {
    expect(wellBeside(groups, 'A1', 'ArrowUp')).toBeNull();
    expect(wellBeside(groups, 'C1', 'ArrowRight')).toBeNull();
  });
});

describe('the well to begin with', () => {
  it('is the one that the address asks for', () => {
    expect(firstWell(wells, 'A2')?.wellId).toBe('A2');
  });

  it('is else the usable one that was followed the furthest', () => {
    expect(firstWell(wells, 'gone')?.wellId).toBe('C2');
  });
});
