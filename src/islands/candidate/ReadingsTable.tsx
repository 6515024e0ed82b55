import type { CandidateWell } from '../../contracts/candidate';
import { withUnit, type DisplayUnit } from '../charts/displayUnits';
import { plotNumber } from '../charts/plotNumber';
import { cellOf } from './sourceCells';
import { residualsOf } from './wellPlot';

export interface ReadingsTableProps {
  well: CandidateWell;
  quantity: string;
  timeUnit: DisplayUnit;
  readingUnit: DisplayUnit;
}

/** The same as the charts, as numbers. */
export function ReadingsTable({ well, quantity, timeUnit, readingUnit }: ReadingsTableProps) {
  const residuals = new Map(residualsOf(well).map((point) => [point.place, point]));
  return (
    <details className="mt-4">
      <summary className="text-accent min-h-6 w-fit cursor-pointer">
        Readings of {well.position} as a table
      </summary>
      <div
        className="mt-2 max-h-96 w-fit max-w-full overflow-auto"
        tabIndex={0}
        role="region"
        aria-label="Readings"
      >
        <table className="border-collapse text-[13.5px] leading-5 tabular-nums">
          <thead>
            <tr className="text-quiet border-rule bg-ground sticky top-0 border-b text-right text-[13px]">
              <th scope="col" className="py-1 pr-6 font-normal">
                {withUnit('Time', timeUnit.unit)}
              </th>
              <th scope="col" className="py-1 pr-6 font-normal">
                {withUnit(quantity, readingUnit.unit)}
              </th>
              <th scope="col" className="py-1 pr-6 font-normal">
                {withUnit('Reading − curve', readingUnit.unit)}
              </th>
              <th scope="col" className="py-1 text-left font-normal">
                Cell
              </th>
            </tr>
          </thead>
          <tbody>
            {well.timesS.map((timeS, index) => {
              const value = well.values[index] ?? null;
              const place = cellOf(well.source, index);
              const residual = residuals.get(place);
              return (
                <tr key={place} className="border-rule border-b text-right">
                  <td className="py-0.5 pr-6">{plotNumber(timeS * timeUnit.factor, 5)}</td>
                  <td className="py-0.5 pr-6">
                    {value === null ? 'left out' : plotNumber(value * readingUnit.factor, 5)}
                  </td>
                  <td className="py-0.5 pr-6">
                    {residual ? plotNumber(residual.residual * readingUnit.factor, 2) : '–'}
                    {residual?.outlier && ' stands out'}
                  </td>
                  <td className="text-quiet py-0.5 text-left">{place}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
    </details>
  );
}
