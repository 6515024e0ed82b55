import type { CatalystAnalysis, SeriesAnalysis, WarningCode } from './types';

/** For each warning one sentence: what is seen, what it may mean, what to do next. */
const WARNINGS: Record<WarningCode, string> = {
  'unsorted-times':
    'The times were not in ascending order and were sorted; check that times and readings were not mixed up.',
  'too-few-readings':
    'Fewer than 3 usable readings, so nothing can be fitted; measure more points or bring excluded ones back.',
  'too-few-distinct-times':
    'Fewer than 3 different times, so no curve can be drawn through the readings; spread the sampling.',
  'too-few-for-order':
    'Fewer than 5 readings cannot tell an order; the initial rate stands, and 8 or more readings would decide.',
  'low-conversion':
    'Less than half of the reactant was converted, where all orders look alike; run to 70 % or more.',
  'laws-equally-good':
    'Two orders describe the readings about equally well, so none is asserted; run to higher conversion or repeat with less noise.',
  'no-simple-order':
    'A curve that is no simple order describes the readings better; saturation, loss of activity or a level that stays may be at work: compare a second dose of reactant.',
  'order-uncertain':
    'The free order is not tied down to one whole number; more readings at high conversion would decide.',
  'lack-of-fit':
    'The residuals stay on one side for long stretches, so the law misses something systematic; look at drift, evaporation or a change of mechanism.',
  outlier:
    'At least one reading lies far off the curve and still counts; check it at the instrument and exclude it with a reason if it was wrong.',
  rising:
    'The readings go the wrong way, away from reaction; check what was followed, evaporation and the calibration.',
  'initial-concentration-needed':
    'The readings are relative, so k of this order needs the initial concentration; enter it to get k, meanwhile only kRel is known.',
  'exact-fit':
    'The readings lie on the curve to the last digit, as calculated values do; uncertainties mean nothing here.',
  'loading-unknown':
    'No common catalyst loading is given, so figures stand at the loading of the wells themselves; enter mass, volume and the reference loading before ranking.',
  'loading-mixed':
    'The wells differ in catalyst loading, or some have none on record and were left out; complete mass and volume of every well.',
  'mixed-forced-laws':
    'The wells force different laws, so the catalyst was judged from its readings instead; force one law for all or for none.',
  'one-temperature':
    'Only one temperature reacted, so there is no activation energy; measure at three or more.',
  'two-temperatures':
    'A line through two temperatures has no error to judge it by, so the activation energy has no interval; add a third temperature.',
  'order-changes-with-temperature':
    'Different temperatures assert different orders, as when coverage of the surface changes; one activation energy would mix two regimes, so look at the temperatures apart.',
  'arrhenius-curved':
    'The Arrhenius plot bends, so one activation energy does not hold over the whole range; fit the straight part alone.',
  'arrhenius-bends-down':
    'The rate falls behind at the hot end; transport, loss of activity, equilibrium or desorption can do this: vary stirring and catalyst mass there, and repeat the lowest temperature last.',
  'arrhenius-bends-up':
    'The rate runs ahead of the line at the ends; a second path may take over when hot, or the blank set the rate when cold: measure the blank at each temperature.',
  'pore-diffusion':
    'The upper temperatures show about half the activation energy of the lower ones, as when diffusion in the pores sets the rate; crush the particles finer and repeat the hottest wells.',
  'hot-wells-deactivate':
    'The wells at the highest temperature fade like a catalyst that loses activity, the cooler ones do not; leave that temperature out of the line or shorten its runs.',
  'one-step-disagrees':
    'The fit of all readings at once gives another activation energy than the line through the single wells; look for wells that the law or the line misses.',
  'low-activation-energy':
    'The apparent activation energy is below 20 kJ/mol, as when transport to the particle sets the rate; vary stirring and particle size before reading chemistry into it.',
  'negative-activation-energy':
    'The rate falls with temperature; desorption of the reactant or loss of activity can do this: repeat the lowest temperature last.',
  'blank-reacts':
    'A blank near these temperatures reacts too, and its share is still in these figures; measure the blank at each temperature so that it can be taken off.',
  'blank-subtracted':
    'The blank reacts too; its rate was taken off, so figures are the catalyst’s own, but for the time to target, in which both work together.',
  'not-above-blank':
    'After the blank is taken off no rate is left; raise the loading, or find what reacts in the blank.',
  'level-by-request':
    'A level that stays was fitted as asked; k is that of the approach to it. Ask whether it is an inert remainder, an equilibrium or a baseline: time and rate at the reference are not given.',
  'rate-below-mass':
    'The rate grows less than in proportion to the catalyst, so something else limits it, as supply of gas or transport to the particles; rates per gram do not compare: use less catalyst or stir harder.',
  'extrapolated-temperature':
    'The reference temperature lies outside the measured ones, so figures there rest on the line alone; measure closer to it.',
  'extrapolated-concentration':
    'The reference concentration lies outside the measured range, where the order may differ; start a well from there.',
  'few-wells': 'A single reacting well decides; repeat it before trusting the order.',
  'no-reacting-wells':
    'The wells taken together show no reaction beyond their noise; raise temperature, loading or time if activity was expected.',
  'reacts-only-together':
    'All wells together show a slow reaction, but none by itself, so no rate can be given; raise temperature, loading or time to measure it.',
};

/** The sentence for a warning. */
export function explainWarning(code: WarningCode): string {
  return WARNINGS[code];
}

const ORDER_NAME = ['Zero', 'First', 'Second'] as const;
const LAW_ORDER: Record<string, number> = { zero: 0, first: 1, second: 2 };

const percent = (share: number) => `${Math.round(share * 100)} %`;

function nameOfOrder(order: number | null): string {
  if (order === null) return 'An order';
  return `${ORDER_NAME[order] ?? `Order ${Number(order.toPrecision(3))}`}${ORDER_NAME[order] ? ' order' : ''}`;
}

/** "First and second order", the two laws of most weight. */
function rivalOrders(weights: readonly (readonly [string, number])[]): string | null {
  const ranked = [...weights].filter(([name]) => name in LAW_ORDER).sort((a, b) => b[1] - a[1]);
  if (ranked.length < 2) return null;
  const [low, high] = ranked
    .slice(0, 2)
    .map(([name]) => LAW_ORDER[name]!)
    .sort((a, b) => a - b);
  return `${ORDER_NAME[low!]} and ${ORDER_NAME[high!]!.toLowerCase()} order`;
}

function adviseUndetermined(
  weights: readonly (readonly [string, number])[],
  conversion: number | null,
  warnings: readonly WarningCode[],
): string {
  for (const code of ['reacts-only-together', 'too-few-for-order'] as const) {
    if (warnings.includes(code)) return WARNINGS[code];
  }
  const advice =
    conversion !== null && conversion < 0.7
      ? `: only ${percent(Math.max(conversion, 0))} was converted. Run to 70 % or more.`
      : '. Repeat with more readings or less noise.';
  if (warnings.includes('laws-equally-good')) {
    const rivals = rivalOrders(weights);
    if (rivals !== null) return `${rivals} cannot be told apart${advice}`;
  }
  if (warnings.includes('no-simple-order')) {
    return `No simple order is safe, because a bent curve fits at least as well${advice}`;
  }
  return `The order is not tied down to one whole number${advice}`;
}

/** The verdict on one well as a sentence for a chemist. */
export function explainSeries(analysis: SeriesAnalysis): string {
  const weights = Object.entries(analysis.fits).map(
    ([name, fit]) => [name, fit.weight ?? 0] as const,
  );
  switch (analysis.verdict) {
    case 'zero':
    case 'first':
    case 'second': {
      const others = weights
        .filter(([name]) => name !== analysis.verdict)
        .reduce((most, [, weight]) => Math.max(most, weight), 0);
      const own = analysis.fits[analysis.verdict]?.weight ?? 1;
      const ratio = others > 0 ? own / others : Infinity;
      const times = ratio > 1000 ? 'more than 1,000' : `${Math.round(ratio)}`;
      return `${nameOfOrder(analysis.order)}: its curve has ${times} times the support of the next order, and nothing in the residuals speaks against it.`;
    }
    case 'saturating':
      return 'Saturating: zero order on a full surface that turns first order as the reactant runs out.';
    case 'forced':
      return `${nameOfOrder(analysis.order)} by choice: the law was set by hand, not found.`;
    case 'other':
      return WARNINGS['no-simple-order'];
    case 'undetermined':
      return adviseUndetermined(weights, analysis.conversion, analysis.warnings);
    case 'no-reaction':
      return analysis.warnings.includes('rising')
        ? WARNINGS.rising
        : 'No reaction: the readings do not fall beyond their noise.';
    case 'unusable':
      return analysis.warnings.includes('too-few-distinct-times')
        ? WARNINGS['too-few-distinct-times']
        : WARNINGS['too-few-readings'];
  }
}

/** The verdict on a catalyst as a sentence for a chemist. */
export function explainCatalyst(result: CatalystAnalysis): string {
  const wells = result.wells === 1 ? 'its one well' : `its ${result.wells} wells together`;
  switch (result.verdict) {
    case 'zero':
    case 'first':
    case 'second':
      return `${nameOfOrder(result.order)}, decided by ${wells} at ${result.temperatures} temperature${result.temperatures === 1 ? '' : 's'}.`;
    case 'saturating':
      return `Saturating, decided by ${wells}.`;
    case 'forced':
      return `${nameOfOrder(result.order)} by choice: the law was set by hand, not found.`;
    case 'other':
      return result.warnings.includes('order-changes-with-temperature')
        ? WARNINGS['order-changes-with-temperature']
        : WARNINGS['no-simple-order'];
    case 'undetermined':
      return adviseUndetermined(Object.entries(result.weights), result.conversion, result.warnings);
    case 'no-reaction':
      return WARNINGS['no-reacting-wells'];
    case 'unusable':
      return 'None of its wells has enough usable readings to fit.';
  }
}
