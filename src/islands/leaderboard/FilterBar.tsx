import type { ReactNode } from 'react';
import type { LeaderboardRow } from '../../contracts/leaderboard';
import { verdictWords } from '../../screening/decayMarks';
import { decisionStates } from '../../screening/decisions';
import { stateLabels } from '../candidate/decisionWords';
import { DecayMark } from '../DecayMark';
import { isNarrowed, verdicts, type LeaderboardLook } from './address';
import { countOf, tagsOf } from './filterRows';

export interface FilterBarProps {
  rows: readonly LeaderboardRow[];
  look: LeaderboardLook;
  onChange: (look: LeaderboardLook) => void;
}

const toggled = <T,>(list: readonly T[], value: T): T[] =>
  list.includes(value) ? list.filter((one) => one !== value) : [...list, value];

/** Search and filters. The verdict buttons say at once how the campaign went. */
export function FilterBar({ rows, look, onChange }: FilterBarProps) {
  const byVerdict = countOf(rows, verdicts, (row) => [row.verdict]);
  const byState = countOf(rows, decisionStates, (row) => [row.decision.state]);
  const byTag = countOf(rows, tagsOf(rows), (row) => row.tags);
  return (
    <div role="search" aria-label="Narrow the leaderboard" className="filters">
      <input
        type="search"
        aria-label="Search code, composition or tag"
        placeholder="Code, metal, support, tag"
        value={look.search}
        onChange={(event) => onChange({ ...look, search: event.target.value })}
        className="search"
      />
      <Group name="Verdict">
        {byVerdict.map(({ value, count }) => (
          <Toggle
            key={value}
            pressed={look.verdicts.includes(value)}
            count={count}
            onPress={() => onChange({ ...look, verdicts: toggled(look.verdicts, value) })}
          >
            <DecayMark verdict={value} silent /> {verdictWords[value]}
          </Toggle>
        ))}
      </Group>
      {byState.length > 1 && (
        <Group name="Decision">
          {byState.map(({ value, count }) => (
            <Toggle
              key={value}
              pressed={look.states.includes(value)}
              count={count}
              onPress={() => onChange({ ...look, states: toggled(look.states, value) })}
            >
              {stateLabels[value]}
            </Toggle>
          ))}
        </Group>
      )}
      {byTag.length > 0 && (
        <Group name="Tag">
          {byTag.map(({ value, count }) => (
            <Toggle
              key={value}
              pressed={look.tags.includes(value)}
              count={count}
              onPress={() => onChange({ ...look, tags: toggled(look.tags, value) })}
            >
              {value}
            </Toggle>
          ))}
        </Group>
      )}
      {isNarrowed(look) && (
        <button
          type="button"
          className="clear"
          onClick={() => onChange({ ...look, search: '', verdicts: [], states: [], tags: [] })}
        >
          Show all {rows.length}
        </button>
      )}
    </div>
  );
}

function Group({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div role="group" aria-label={name} className="filter-group">
      {children}
    </div>
  );
}

function Toggle(props: {
  pressed: boolean;
  count: number;
  onPress: () => void;
  children: ReactNode;
}) {
  const { pressed, count, onPress, children } = props;
  return (
    <button type="button" aria-pressed={pressed} onClick={onPress} className="toggle">
      {children} <span className="count">{count}</span>
    </button>
  );
}
