import type { Verdict } from '../kinetics/types';
import type { Calibration } from './calibrate';
import { TRUTHS } from './truths';

const VERDICTS: readonly Verdict[] = [
  'zero',
  'first',
  'second',
  'saturating',
  'other',
  'undetermined',
  'no-reaction',
];

const percent = (share: number, digits = 1) => `${(100 * share).toFixed(digits)} %`;

function confusion(table: Calibration['wells']['table']): string[] {
  return [
    `| what it is | ${VERDICTS.join(' | ')} |`,
    `| --- |${VERDICTS.map(() => ' ---: |').join('')}`,
    ...TRUTHS.map(
      (truth) => `| ${truth} | ${VERDICTS.map((one) => table[truth][one] ?? 0).join(' | ')} |`,
    ),
  ];
}

/** The calibration as a page of its own, in Markdown. */
export function writeTable({ wells, forcedCoverage, catalysts, coverage }: Calibration): string {
  const rates: [string, string, string][] = [
    [
      'wells of a simple order given another one',
      percent(wells.otherSimpleOrder, 2),
      'at most 0.5 %',
    ],
    ['wells of a simple order told right', percent(wells.right), 'at least 35 %'],
    [
      'the same of good wells (conversion ≥ 0.7, noise ≤ 2 %, 15 readings or more)',
      percent(wells.rightOfGood),
      'at least 90 %',
    ],
    ['order assertions that are wrong, strictly', percent(wells.wrongOrders), 'at most 5 %'],
    [
      'the same, a saturating well near a limit may be called by it',
      percent(wells.wrongOrdersBesideLimits),
      'at most 2 %',
    ],
    ['saturating wells told as such', percent(wells.saturatingFound), ''],
    ['saturating asserted, and wrong', percent(wells.wrongSaturating), ''],
    ['dead wells kept as such', percent(wells.deadKept), 'at least 98 %'],
    [
      '95 % intervals of k that hold it, after the verdict',
      percent(wells.coverageAfterVerdict),
      '',
    ],
    ...Object.entries(forcedCoverage).map(([order, share]): [string, string, string] => [
      `the same, ${order} order forced`,
      percent(share),
      '94 to 96 %',
    ]),
  ];
  return [
    '# Calibration',
    '',
    'Written by `npm run calibrate`; do not edit. Simulated wells and catalysts with fixed seeds,',
    'their ranges in `simulateWells.ts` and `simulateCatalysts.ts`, judged by the engine as any other.',
    '',
    `## Single wells (${wells.wells})`,
    '',
    ...confusion(wells.table),
    '',
    '| share | found | wanted |',
    '| --- | ---: | --- |',
    ...rates.map((row) => `| ${row.join(' | ')} |`),
    '',
    '## Whole catalysts (4 temperatures × 2 wells, 1 and 3 % noise)',
    '',
    ...confusion(catalysts),
    '',
    '## First-order catalysts: 95 % intervals that hold the truth',
    '',
    '| wells | told first | told another order | Ea | k at the centre | curvature said |',
    '| --- | ---: | ---: | ---: | ---: | ---: |',
    ...coverage.map(
      (row) =>
        `| ${row.name} | ${percent(row.told)} | ${percent(row.wrong)} | ${percent(row.activationEnergy)} | ${percent(row.kRef)} | ${percent(row.curvatureAlarms)} |`,
    ),
    '',
  ].join('\n');
}
