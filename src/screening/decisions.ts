/** Where a candidate stands. `open` is where each one begins and where reopening leads. */
export const decisionStates = ['open', 'nominated', 'scale-up', 'waiting', 'set-aside'] as const;
export type DecisionState = (typeof decisionStates)[number];

/** What a person does to move a candidate on. */
export const decisionActions = [
  'nominate',
  'take-to-scale-up',
  'wait',
  'set-aside',
  'reopen',
] as const;
export type DecisionAction = (typeof decisionActions)[number];

/** From where each step leads to where. What is not listed is not possible. */
const steps: Record<DecisionAction, { from: readonly DecisionState[]; to: DecisionState }> = {
  nominate: { from: ['open'], to: 'nominated' },
  'take-to-scale-up': { from: ['open', 'nominated', 'waiting'], to: 'scale-up' },
  wait: { from: ['open', 'nominated'], to: 'waiting' },
  'set-aside': { from: ['open', 'nominated', 'waiting'], to: 'set-aside' },
  reopen: { from: ['nominated', 'scale-up', 'waiting', 'set-aside'], to: 'open' },
};

/** Where a candidate stands after a step; null when the step is not possible from `state`. */
export function stateAfter(state: DecisionState, action: DecisionAction): DecisionState | null {
  const step = steps[action];
  return step.from.includes(state) ? step.to : null;
}

/** The steps that are possible from `state`. */
export function actionsFrom(state: DecisionState): DecisionAction[] {
  return (Object.keys(steps) as DecisionAction[]).filter((action) =>
    steps[action].from.includes(state),
  );
}
