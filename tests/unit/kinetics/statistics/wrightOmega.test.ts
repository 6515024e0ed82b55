import { describe, expect, it } from 'vitest';
import { lnWrightOmega, wrightOmega } from '../../../../src/kinetics/statistics/wrightOmega';

/** x (an exact double), ω(x), ln ω(x): mpmath 1.3.0, Newton's method with 40 digits. */
const certified: [x: number, omega: number, lnOmega: number][] = [
  [-500, 7.124576406741286e-218, -500],
  [-300.25, 4.009422364622857e-131, -300.25],
  [-100, 3.720075976020836e-44, -100],
  [-50.5, 1.1698459177061964686e-22, -50.5],
  [-49.5, 3.1799709001977494982e-22, -49.5],
  [-20, 2.0611536181902035858e-9, -20.000000002061153618],
  [-5, 0.0066930004977309932744, -5.0066930004977309933],
  [-2.0000001, 0.12002822827110482183, -2.1200283282711046582],
  [-2, 0.12002823898764122948, -2.1200282389876412295],
  [-1, 0.27846454276107379511, -1.2784645427610737951],
  [-0.5, 0.40467384854593852056, -0.90467384854593852056],
  [0, 0.567143290409783873, -0.567143290409783873],
  [0.1, 0.60406819002589212693, -0.50406819002589212138],
  [0.5, 0.76624860816175025888, -0.26624860816175025888],
  [1.5, 1.264959720125500542, 0.23504027987449945803],
  [2, 1.5571455989976114169, 0.44285440100238858314],
  [2.5, 1.872647040416594383, 0.62735295958340561699],
  [2.75, 2.0380208396915936917, 0.71197916030840630834],
  [3, 2.2079400315693229986, 0.79205996843067700142],
  [3.141592653589793, 2.3060545683741137946, 0.83553808521567932142],
  [5, 3.6934413589606498043, 1.3065586410393501957],
  [10, 7.9294200950196973486, 2.0705799049803026514],
  [33.3, 29.902072217085581169, 3.3979277829144159884],
  [100, 95.44148664557583184, 4.5585133544241681598],
  [250.125, 244.62527246049594482, 5.4997275395040551753],
  [500, 493.7978737290337246, 6.2021262709662753997],
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
