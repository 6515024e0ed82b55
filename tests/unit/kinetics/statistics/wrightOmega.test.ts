import { describe, expect, it } from 'vitest';
import { lnWrightOmega, wrightOmega } from '../../../../src/kinetics/statistics/wrightOmega';

/** x (an exact double), ω(x), ln ω(x): mpmath 1.3.0, Newton's method with 40 digits. */
const certified: [x: number, omega: number, lnOmega: number][] = [
  [-500, 7.124576406741286e-218, -500],
  [-300.25, 4.009422364622857e-131, -300.25],
  [-100, 3.720075976020836e-44, -100],
  [-50.5, 1.1698459177061964e-22, -50.5],
  [-49.5, 3.1799709001977496e-22, -49.5],
  [-20, 2.0611536181902037e-9, -20.000000002061153],
  [-5, 0.006693000497730993, -5.006693000497731],
  [-2.0000001, 0.12002822827110482, -2.1200283282711045],
  [-2, 0.12002823898764123, -2.1200282389876413],
  [-1, 0.2784645427610738, -1.2784645427610737],
  [-0.5, 0.4046738485459385, -0.9046738485459386],
  [0, 0.5671432904097838, -0.5671432904097838],
  [0.1, 0.6040681900258922, -0.5040681900258921],
  [0.5, 0.7662486081617502, -0.2662486081617503],
  [1.5, 1.2649597201255005, 0.23504027987449946],
  [2, 1.5571455989976115, 0.4428544010023886],
  [2.5, 1.8726470404165945, 0.6273529595834056],
  [2.75, 2.0380208396915935, 0.7119791603084064],
  [3, 2.207940031569323, 0.792059968430677],
  [3.141592653589793, 2.3060545683741136, 0.8355380852156793],
  [5, 3.6934413589606496, 1.3065586410393502],
  [10, 7.929420095019697, 2.0705799049803026],
  [33.3, 29.902072217085582, 3.397927782914416],
  [100, 95.44148664557584, 4.558513354424168],
  [250.125, 244.62527246049595, 5.499727539504055],
  [500, 493.7978737290337, 6.202126270966275],
];

describe('wrightOmega', () => {
  it.each(certified)('agrees at %d with mpmath to 14 digits', (x, omega, lnOmega) => {
    expect(Math.abs(wrightOmega(x) / omega - 1)).toBeLessThan(1e-14);
    expect(Math.abs(lnWrightOmega(x) / lnOmega - 1)).toBeLessThan(1e-14);
  });

  it('is 1 at 1', () => {
    expect(wrightOmega(1)).toBe(1);
    expect(lnWrightOmega(1)).toBe(0);
  });

  it('satisfies its equation all along the axis', () => {
    for (let x = -700; x <= 700; x += 0.37) {
      const y = lnWrightOmega(x);
      expect(Math.abs(y + Math.exp(y) - x)).toBeLessThanOrEqual(4e-16 * (1 + Math.abs(x)) * 4);
    }
  });

  it('has an answer at the ends of the axis', () => {
    expect(wrightOmega(-1e300)).toBe(0);
    expect(lnWrightOmega(-1e300)).toBe(-1e300);
    expect(wrightOmega(1e300)).toBe(1e300);
    expect(lnWrightOmega(1e300)).toBeCloseTo(690.775527898, 8);
    expect(wrightOmega(Infinity)).toBe(Infinity);
  });
});
