import type { SeriesAnalysis } from '../../kinetics/types';
import { readingUnitFor, withUnit, type DisplayUnit } from '../charts/displayUnits';
import { plotNumber } from '../charts/plotNumber';
import { DecayMark } from '../DecayMark';
import { figureOf, percent } from './figures';
import { lawRows, type LawRow } from './lawEvidence';

const numeric = 'py-1.5 pr-4 text-right whitespace-nowrap tabular-nums';
const numericHead = 'py-1.5 pr-4 text-right font-normal';

/** The rival laws on one well, with what speaks for and against each. */
export function LawTable({ analysis }: { analysis: SeriesAnalysis }) {
  const rows = lawRows(analysis);
  if (rows.length === 0) return <p className="text-quiet">No law could be fitted to this well.</p>;
  const c0 = readingUnitFor(
    analysis.dimension,
    Math.max(...rows.map(({ fit }) => Math.abs(fit.c0 ?? 0))),
  );
  const sd = readingUnitFor(
    analysis.dimension,
    Math.max(...rows.map(({ fit }) => fit.residualSd ?? 0)),
  );
  return (
    <div className="overflow-x-auto" role="region" aria-label="Rival laws" tabIndex={0}>
      <table className="stacks w-full border-collapse text-[13.5px] leading-5">
        <caption className="sr-only">Rate laws fitted to this well</caption>
        <thead>
          <tr className="text-quiet border-rule border-b text-left align-bottom text-[13px]">
            <th scope="col" className="py-1.5 pr-4 font-normal">
              Law
            </th>
            <th scope="col" className={numericHead}>
              k ± s.e.
            </th>
            <th scope="col" className={numericHead}>
              {withUnit('C₀', c0.unit)}
            </th>
            <th scope="col" className={numericHead}>
              {withUnit('Residual s.d.', sd.unit)}
            </th>
            <th scope="col" className={numericHead}>
              ΔAICc
            </th>
            <th scope="col" className={numericHead}>
              Weight
            </th>
            <th scope="col" className="py-1.5 pl-2 font-normal">
              For and against
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <LawLine key={row.law} row={row} c0={c0} sd={sd} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

function LawLine({ row, c0, sd }: { row: LawRow; c0: DisplayUnit; sd: DisplayUnit }) {
  const { fit } = row;
  const k =
    fit.k === null
      ? null
      : figureOf({ value: fit.k, se: fit.kSe, low: null, high: null }, row.kUnit ?? '');
  return (
    <tr className={`border-rule border-b align-top ${row.shown ? '' : 'text-quiet'}`}>
      <th scope="row" className="py-1.5 pr-4 text-left font-semibold whitespace-nowrap">
        <span className="inline-flex items-center gap-2">
          <DecayMark verdict={row.law === 'order' ? 'other' : row.law} silent />
          {row.name}
        </span>
      </th>
      <td data-column="k" className={numeric}>
        {k ? `${k.text} ${k.unit}` : '–'}
      </td>
      <td data-column={withUnit('C₀', c0.unit)} className={numeric}>
        {fit.c0 === null ? '–' : plotNumber(fit.c0 * c0.factor)}
      </td>
      <td data-column={withUnit('residual s.d.', sd.unit)} className={numeric}>
        {fit.residualSd === null ? '–' : plotNumber(fit.residualSd * sd.factor, 2)}
      </td>
      <td data-column="ΔAICc" className={numeric}>
        {row.deltaAicc === null ? '–' : row.deltaAicc.toFixed(1)}
      </td>
      <td data-column="weight" className={numeric}>
        {fit.weight === null ? '–' : fit.weight < 0.001 ? '< 0.1 %' : percent(fit.weight)}
      </td>
      <td className="whole min-w-48 py-1.5 pl-2">{row.words}</td>
    </tr>
  );
}
