import { describe, expect, it } from 'vitest';
import { explainProposal, type Proposal } from '../../../../src/kinetics';
import {
  celsiusToSet,
  durationNear,
  durationUp,
} from '../../../../src/kinetics/planning/benchWords';

const tell: Proposal = {
  code: 'sample-to',
  seriesId: 'P1-A1',
  temperatureK: 333.15,
  laws: ['first', 'second'],
  timesS: [0, 3700, 7410],
  lastS: 7410,
  readings: 3,
  conversion: 0.784,
  readingsAtPresentDuration: null,
  instead: 347.6,
  noiseShare: null,
  replicates: null,
  evidenceRatio: 40,
};

describe('a proposal in words', () => {
  it('says the time, the temperature that would do instead, and what it tells', () => {
    expect(explainProposal(tell)).toBe(
      'Sample 60 °C to 2.1 h (3 readings, about 78 % conversion), or add 75 °C at the present run time, to tell first from second order.',
    );
    expect(explainProposal({ ...tell, instead: null, readingsAtPresentDuration: 48 })).toBe(
      'Sample 60 °C to 2.1 h (3 readings, about 78 % conversion) to tell first from second order. 48 readings within the present run time would do too.',
    );
  });

  it('says how much less noise, or how many replicates, would do', () => {
    expect(
      explainProposal({
        ...tell,
        code: 'lower-noise',
        laws: ['zero', 'first', 'second'],
        noiseShare: 0.5,
        replicates: 4,
      }),
    ).toBe(
      'No run time is expected to tell zero, first and second order apart at this noise: at 60 °C to 2.1 h (3 readings), bring it to 50 % of what it is, or run 4 replicates.',
    );
  });

  it('says which runs an activation energy needs', () => {
    const plan: Proposal = {
      code: 'tighten-activation-energy',
      temperaturesK: [313.15, 353.15],
      replicates: 2,
      halfWidth: 11_300,
      expectedHalfWidth: 4640,
      target: 5000,
      reachesTarget: true,
      repeats: false,
    };
    expect(explainProposal(plan)).toBe(
      'Add 40 °C and 80 °C (2 wells each): the activation energy is then expected within ± 4.6 kJ/mol; it is within ± 11 kJ/mol now.',
    );
    expect(
      explainProposal({
        ...plan,
        temperaturesK: [313.15, 313.15, 353.15, 353.15],
        repeats: true,
        reachesTarget: false,
        expectedHalfWidth: 7200,
      }),
    ).toBe(
      'Run 40 °C and 80 °C once more (2 wells each on 2 plates): the activation energy is then expected within ± 7.2 kJ/mol; it is within ± 11 kJ/mol now. ± 5 kJ/mol needs less scatter.',
    );
  });
});

describe('figures at the bench', () => {
  it('are times long enough, in two figures', () => {
    expect(durationUp(7410)).toBe('2.1 h');
    expect(durationUp(3600)).toBe('60 min');
    expect(durationUp(42)).toBe('42 s');
    expect(durationUp(600_000)).toBe('7 d');
    expect(durationNear(0)).toBe('the start');
  });

  it('are whole degrees, hotter rather than too cold', () => {
    expect(celsiusToSet(347.2, true)).toBe('75 °C');
    expect(celsiusToSet(347.2)).toBe('74 °C');
    expect(celsiusToSet(263.15)).toBe('−10 °C');
    expect(celsiusToSet(272.95)).toBe('0 °C');
  });
});
