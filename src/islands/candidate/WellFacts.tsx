import type { CandidateWell } from '../../contracts/candidate';
import { celsius } from '../charts/buildArrheniusOption';
import { plotNumber } from '../charts/plotNumber';
import { percent } from './figures';
import { sourceSentence } from './sourceCells';
import { determination } from './wellPlot';

/** What is known of one well, and where its readings stand in the workbook. */
export function WellFacts({ well, fileName }: { well: CandidateWell; fileName: string }) {
  const { analysis } = well;
  const r2 = determination(well);
  const facts: [string, string | null][] = [
    ['Plate', well.plate],
    ['Position', well.position],
    ['Temperature', `${celsius(well.temperatureK)} (${plotNumber(well.temperatureK, 5)} K)`],
    ['Replicate', well.replicate === null ? null : String(well.replicate)],
    ['Catalyst', well.massG === null ? null : `${plotNumber(well.massG * 1e3)} mg`],
    ['Volume', well.volumeL === null ? null : `${plotNumber(well.volumeL * 1e3)} mL`],
    ['Loading', analysis.loadingGPerL === null ? null : `${plotNumber(analysis.loadingGPerL)} g/L`],
    [
      'Readings',
      analysis.pointsExcluded === 0
        ? `${analysis.pointsUsed} used`
        : `${analysis.pointsUsed} used, ${analysis.pointsExcluded} left out`,
    ],
    ['Conversion', analysis.conversion === null ? null : percent(analysis.conversion)],
    [
      'Free order n',
      analysis.apparentOrder
        ? `${plotNumber(analysis.apparentOrder.value, 3)}${
            analysis.apparentOrder.low !== null && analysis.apparentOrder.high !== null
              ? ` (${plotNumber(analysis.apparentOrder.low, 3)} to ${plotNumber(analysis.apparentOrder.high, 3)})`
              : ''
          }`
        : null,
    ],
    [
      'Residual trend',
      analysis.lackOfFit
        ? `${analysis.lackOfFit.significant ? 'beyond chance' : 'none'}${
            analysis.lackOfFit.runsP === null
              ? ''
              : ` (p\u00a0=\u00a0${plotNumber(analysis.lackOfFit.runsP, 2)})`
          }`
        : null,
    ],
    ['R²', r2 === null ? null : r2.toFixed(4)],
  ];
  return (
    <div>
      <dl className="m-0 grid grid-cols-[auto_1fr] gap-x-4 gap-y-0.5 text-[13.5px] leading-5">
        {facts.map(([name, value]) =>
          value === null ? null : (
            <div key={name} className="contents">
              <dt className="text-quiet">{name}</dt>
              <dd className="m-0 tabular-nums">{value}</dd>
            </div>
          ),
        )}
      </dl>
      <p className="text-quiet mt-3 text-[13px] leading-5 wrap-anywhere">
        {sourceSentence(well.source, fileName)}.
      </p>
    </div>
  );
}
