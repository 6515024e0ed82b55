import { useCallback, useMemo, useState } from 'react';
import type { CandidateWell } from '../../contracts/candidate';
import { buildDecayCurveOption, type OverlaidWell } from '../charts/buildDecayCurveOption';
import { buildResidualOption } from '../charts/buildResidualOption';
import {
  buildStraightenedOption,
  straightenings,
  type StraightLaw,
} from '../charts/buildStraightenedOption';
import { Chart } from '../charts/Chart';
import type { ChartFrame, ChartTheme } from '../charts/chartTheme';
import type { WellPlot } from '../charts/decayChart';
import { replicateSymbols } from '../charts/layers';
import { LawTable } from './LawTable';
import { ReadingsTable } from './ReadingsTable';
import { Warnings } from './Warnings';
import { WellFacts } from './WellFacts';
import { describeDecay, residualPlotOf, wellPlotOf } from './wellPlot';

export interface WellFitProps {
  well: CandidateWell;
  /** The other wells at the same temperature. */
  replicates: readonly CandidateWell[];
  reactant: string;
  fileName: string;
}

const straightLaws: StraightLaw[] = ['zero', 'first', 'second'];

function overlayOf(wells: readonly CandidateWell[]): OverlaidWell[] {
  return wells.map((well) => ({
    label: `${well.plate}, ${well.position}`,
    symbol: replicateSymbols[((well.replicate ?? 1) - 1) % replicateSymbols.length] ?? 'circle',
    timesS: well.timesS,
    values: well.values,
  }));
}

/** One well: its decay, what the curve leaves, the straightened plots and the rival laws. */
export function WellFit({ well, replicates, reactant, fileName }: WellFitProps) {
  const [overlaid, setOverlaid] = useState(false);
  const plot = useMemo(() => wellPlotOf(well, reactant), [well, reactant]);
  const residuals = useMemo(() => residualPlotOf(well), [well]);
  const overlay = useMemo(() => (overlaid ? overlayOf(replicates) : []), [overlaid, replicates]);
  const decay = useCallback(
    (theme: ChartTheme, frame: ChartFrame) => buildDecayCurveOption(plot, theme, frame, overlay),
    [plot, overlay],
  );
  const residual = useCallback(
    (theme: ChartTheme, frame: ChartFrame) => buildResidualOption(residuals, theme, frame),
    [residuals],
  );
  const { quantity, timeUnit, readingUnit } = plot;
  return (
    <div>
      <div className="grid gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,1fr)_17rem]">
        <div className="min-w-0">
          <Chart
            build={decay}
            height={340}
            label={describeDecay(well, plot)}
            caption={plot.curves.band ? 'Tint: 95 % band of the curve.' : undefined}
          />
          {replicates.length > 0 && (
            <label className="mt-1 flex min-h-6 w-fit cursor-pointer items-center gap-2 text-[13.5px] print:hidden">
              <input
                type="checkbox"
                className="accent-accent size-4"
                checked={overlaid}
                onChange={(event) => setOverlaid(event.target.checked)}
              />
              Lay the other {replicates.length === 1 ? 'well' : `${replicates.length} wells`} of
              this temperature behind
            </label>
          )}
          {residuals.points.length > 0 && (
            <div className="mt-6">
              <Chart
                build={residual}
                height={190}
                label={`Residuals of well ${well.position} against time, with guides at one residual standard deviation. The same numbers stand in the table of readings.`}
              />
            </div>
          )}
        </div>
        <div className="space-y-4">
          <p className="max-w-[60ch]">{well.explanation}</p>
          <Warnings
            warnings={well.warnings}
            except={well.explanation}
            className="text-[13.5px] leading-5"
          />
          <WellFacts well={well} fileName={fileName} />
        </div>
      </div>
      <h3 className="mt-10 mb-2 text-[15px] font-semibold">Rival laws</h3>
      <LawTable analysis={well.analysis} />
      {well.analysis.kind === 'reactant' && <Straightened plot={plot} position={well.position} />}
      <ReadingsTable
        well={well}
        quantity={quantity}
        timeUnit={timeUnit}
        readingUnit={readingUnit}
      />
    </div>
  );
}

function Straightened({ plot, position }: { plot: WellPlot; position: string }) {
  return (
    <section>
      <h3 className="mt-10 mb-1 text-[15px] font-semibold">Straightened, for the eye</h3>
      <p className="text-quiet mb-3 text-[13px]">
        The fits are made on the readings as measured; a bend here is only a hint.
      </p>
      <div className="grid gap-x-8 gap-y-6 sm:grid-cols-3">
        {straightLaws.map((law) => (
          <StraightenedChart key={law} law={law} plot={plot} position={position} />
        ))}
      </div>
    </section>
  );
}

function StraightenedChart(props: { law: StraightLaw; plot: WellPlot; position: string }) {
  const { law, plot, position } = props;
  const build = useCallback(
    (theme: ChartTheme, frame: ChartFrame) => buildStraightenedOption(plot, law, theme, frame),
    [plot, law],
  );
  const { title } = straightenings[law];
  return (
    <div className="min-w-0">
      <p className="text-[13.5px]">{title}</p>
      <Chart build={build} height={220} label={`${title}: readings of well ${position}.`} />
    </div>
  );
}
