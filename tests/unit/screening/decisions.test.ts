import { describe, expect, it } from 'vitest';
import {
  actionsFrom,
  decisionActions,
  decisionStates,
  stateAfter,
} from '../../../src/screening/decisions';

describe('decisions', () => {
  it('lead a candidate from open through nomination to scale-up', () => {
    expect(stateAfter('open', 'nominate')).toBe('nominated');
    expect(stateAfter('nominated', 'take-to-scale-up')).toBe('scale-up');
  });

  it('cannot nominate what was set aside before it is reopened', () => {
    expect(stateAfter('set-aside', 'nominate')).toBeNull();
    expect(stateAfter('set-aside', 'reopen')).toBe('open');
  });

  it('never leave a candidate where it stood, and leave a way on from everywhere', () => {
    for (const state of decisionStates) {
      expect(actionsFrom(state).length).toBeGreaterThan(0);
      for (const action of decisionActions) expect(stateAfter(state, action)).not.toBe(state);
    }
  });
});
