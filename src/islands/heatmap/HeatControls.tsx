import type { RateLawName } from '../../kinetics/types';
import { lawName } from '../candidate/lawWords';
import type { HeatmapLook } from './address';
import { metricIds, metricNames, type MetricId } from './metrics';

export interface HeatControlsProps {
  look: HeatmapLook;
  laws: readonly RateLawName[];
  law: RateLawName | null;
  onChange: (look: HeatmapLook) => void;
}

/** What the cells show, and how. */
export function HeatControls({ look, laws, law, onChange }: HeatControlsProps) {
  const offered = metricIds.filter((id) => id !== 'k' || laws.length > 0);
  const choose = (metric: MetricId) => onChange({ ...look, metric });
  return (
    <div className="filters mb-5">
      <div role="group" aria-label="What the cells show" className="filter-group">
        {offered.map((id) => (
          <button
            key={id}
            type="button"
            className="toggle"
            aria-pressed={look.metric === id}
            onClick={() => choose(id)}
          >
            {metricNames[id]}
          </button>
        ))}
      </div>
      {look.metric === 'k' && (
        <label className="flex items-center gap-2 whitespace-nowrap">
          of
          <select
            className="select"
            value={law ?? ''}
            onChange={(event) => onChange({ ...look, law: event.target.value as RateLawName })}
          >
            {laws.map((one) => (
              <option key={one} value={one}>
                {lawName(one).toLowerCase()}
              </option>
            ))}
          </select>
        </label>
      )}
      {look.metric !== 'verdict' && (
        <div role="group" aria-label="Draw the cells as" className="filter-group">
          {(['numbers', 'discs'] as const).map((cells) => (
            <button
              key={cells}
              type="button"
              className="toggle"
              aria-pressed={look.cells === cells}
              onClick={() => onChange({ ...look, cells })}
            >
              {cells === 'numbers' ? 'Numbers' : 'Discs'}
            </button>
          ))}
        </div>
      )}
    </div>
  );
}
