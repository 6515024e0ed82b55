import { useCallback, useMemo } from 'react';
import type { CandidateView } from '../../contracts/candidate';
import { buildArrheniusOption, celsius, whiskerReach } from '../charts/buildArrheniusOption';
import { Chart } from '../charts/Chart';
import type { ChartFrame, ChartTheme } from '../charts/chartTheme';
import { plotNumber } from '../charts/plotNumber';
import { arrheniusPlotOf } from './arrheniusPlot';
import { figureOf } from './figures';
import { OneStepNote } from './OneStepNote';

export interface ArrheniusSectionProps {
  view: CandidateView;
  chosen: string;
  onChoose: (wellId: string) => void;
}

/** ln k against 1000/T over all wells, or why there is no such plot. */
export function ArrheniusSection({ view, chosen, onChoose }: ArrheniusSectionProps) {
  const plot = useMemo(() => arrheniusPlotOf(view, chosen), [view, chosen]);
  const build = useCallback(
    (theme: ChartTheme, frame: ChartFrame) =>
      plot ? buildArrheniusOption(plot, theme, frame) : { series: [] },
    [plot],
  );
  const { result } = view;
  const energy = result.activationEnergy ?? result.initialRateActivationEnergy;
  const figure = energy && figureOf(energy, 'kJ/mol', 1e-3);
  return (
    <section aria-labelledby="arrhenius">
      <h2 id="arrhenius" className="mb-2 text-[18px] font-semibold">
        Temperature
      </h2>
      {!plot || !figure ? (
        <p className="text-quiet max-w-[68ch]">
          No activation energy: it takes wells that react at two temperatures or more, and three for
          an interval.
        </p>
      ) : (
        <>
          <p className="max-w-[72ch]">
            Apparent activation energy{' '}
            <strong className="font-semibold tabular-nums">
              {figure.text} {figure.unit}
            </strong>
            {figure.interval && ` (95 %: ${figure.interval})`}
            {result.basis === 'initial-rate' && ', of initial rates'}.
          </p>
          <OneStepNote oneStep={result.oneStep ?? null} />
          <div className="mt-2 max-w-3xl">
            <Chart
              build={build}
              height={400}
              onPick={onChoose}
              label={`Arrhenius plot of ${view.catalyst.code}: ${plot.points.length} wells from ${celsius(
                Math.min(...plot.points.map(({ temperatureK }) => temperatureK)),
              )} to ${celsius(Math.max(...plot.points.map(({ temperatureK }) => temperatureK)))}. The points stand in the table below.`}
              caption={`Whiskers: ± ${whiskerReach} standard errors. Shapes: replicates.${plot.line.low ? ' Tint: 95 % band of the line.' : ''}`}
            />
          </div>
          <details className="mt-2">
            <summary className="text-accent min-h-6 w-fit cursor-pointer">
              Points as a table
            </summary>
            <table className="mt-2 border-collapse text-[13.5px] leading-5 tabular-nums">
              <thead>
                <tr className="text-quiet border-rule border-b text-right text-[13px]">
                  {['Well', 'Temperature', '1000/T, K⁻¹', `${plot.yName}`, 's.e.'].map((name) => (
                    <th key={name} scope="col" className="py-1 pr-6 font-normal first:text-left">
                      {name}
                    </th>
                  ))}
                </tr>
              </thead>
              <tbody>
                {plot.points.map((point) => (
                  <tr key={point.wellId} className="border-rule border-b text-right">
                    <th scope="row" className="py-0.5 pr-6 text-left font-normal">
                      {point.well}
                    </th>
                    <td className="py-0.5 pr-6">{celsius(point.temperatureK)}</td>
                    <td className="py-0.5 pr-6">{point.x.toFixed(4)}</td>
                    <td className="py-0.5 pr-6">{point.y.toFixed(3).replace('-', '−')}</td>
                    <td className="py-0.5 pr-6">{plotNumber(point.se, 2)}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          </details>
        </>
      )}
    </section>
  );
}
