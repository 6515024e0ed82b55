import type { CandidateView } from '../../contracts/candidate';
import type { ArrheniusPlot } from '../charts/buildArrheniusOption';
import { temperatureTints } from '../temperatureTints';
import { printedUnit } from './figures';

/** The plot's points with their wells' names and colours; null when there is no line. */
export function arrheniusPlotOf(
  { arrhenius, wells, result }: CandidateView,
  selectedWellId: string | null,
): ArrheniusPlot | null {
  if (!arrhenius || arrhenius.points.length === 0) return null;
  const wellOf = new Map(wells.map((well) => [well.wellId, well]));
  const colourOf = temperatureTints(wells.map(({ temperatureK }) => temperatureK));
  const symbol = result.basis === 'law' ? 'k' : 'r₀';
  return {
    points: arrhenius.points.map((point) => {
      const well = wellOf.get(point.wellId);
      return {
        ...point,
        replicate: well?.replicate ?? null,
        colour: colourOf(point.temperatureK),
        well: well ? `${well.plate}, ${well.position}` : point.wellId,
      };
    }),
    line: arrhenius.line,
    yName: `ln (${symbol} / ${printedUnit(arrhenius.yUnit)})`,
    selectedWellId,
  };
}
