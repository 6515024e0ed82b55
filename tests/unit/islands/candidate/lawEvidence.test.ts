import { describe, expect, it } from 'vitest';
import { evidenceWords } from '@/islands/candidate/lawEvidence';

const fit = { residualSd: 1, k: 0.1 };
const say = (deltaAicc: number | null, more: Partial<Parameters<typeof evidenceWords>[0]> = {}) =>
  evidenceWords({ fit, deltaAicc, bestSd: 1, rivals: 2, ...more });

// Rules of thumb for differences in AIC: Burnham & Anderson (2002), section 2.6: up to 2
// substantial support, 4 to 7 considerably less, above 10 essentially none.
describe('the words for a rival law', () => {
  it('hold a law within 2 of the best to be as good', () => {
    expect(say(1.9)).toMatch(/cannot tell them apart/);
  });

  it('do not rule out what is a little weaker', () => {
    expect(say(3)).toMatch(/not ruled out/);
  });

  it('say how many times as likely the best is, exp(Δ/2)', () => {
    expect(say(6)).toContain('the best is 20 times as likely');
  });

  it('leave nothing above 10', () => {
    expect(say(10.1)).toMatch(/Next to nothing/);
  });

  it('say how much more widely it misses, and when k cannot be had', () => {
    expect(say(12, { fit: { residualSd: 2.5, k: null } })).toMatch(
      /2\.5 times as widely.*k cannot be had/,
    );
  });

  it('do not weigh where too few readings were left', () => {
    expect(say(null)).toMatch(/Too few readings/);
  });
});
