import type { CandidateWell } from '../../contracts/candidate';

/** The wells of one temperature, by replicate. */
export interface WellGroup {
  /** K. */
  temperatureK: number;
  wells: CandidateWell[];
}

/** Wells by temperature, cold to hot, and in each by replicate, plate and position. */
export function groupWells(wells: readonly CandidateWell[]): WellGroup[] {
  const groups = new Map<number, CandidateWell[]>();
  for (const well of wells) {
    // Measured temperatures of one set temperature differ by tenths; they belong together.
    const key = Math.round(well.temperatureK);
    groups.set(key, [...(groups.get(key) ?? []), well]);
  }
  return [...groups.values()]
    .map((group) => ({
      temperatureK: group.reduce((sum, { temperatureK }) => sum + temperatureK, 0) / group.length,
      wells: group.sort(
        (a, b) =>
          (a.replicate ?? 0) - (b.replicate ?? 0) ||
          a.plate.localeCompare(b.plate, 'en', { numeric: true }) ||
          a.position.localeCompare(b.position, 'en'),
      ),
    }))
    .sort((a, b) => a.temperatureK - b.temperatureK);
}

/** The well to begin with: the one asked for, else a decided one followed the furthest. */
export function firstWell(
  wells: readonly CandidateWell[],
  askedFor: string | null,
): CandidateWell | null {
  const asked = wells.find(({ wellId }) => wellId === askedFor);
  if (asked) return asked;
  const reach = ({ analysis }: CandidateWell) =>
    analysis.verdict === 'unusable' ? -1 : (analysis.conversion ?? 0);
  return wells.reduce<CandidateWell | null>(
    (best, well) => (best === null || reach(well) > reach(best) ? well : best),
    null,
  );
}

/** Where an arrow key leads: left and right across temperatures, up and down among replicates. */
export function wellBeside(
  groups: readonly WellGroup[],
  wellId: string,
  key: string,
): string | null {
  const row = groups.findIndex(({ wells }) => wells.some((well) => well.wellId === wellId));
  const group = groups[row];
  if (!group) return null;
  const column = group.wells.findIndex((well) => well.wellId === wellId);
  const across = (to: WellGroup | undefined) =>
    to?.wells[Math.min(column, to.wells.length - 1)]?.wellId ?? null;
  switch (key) {
    case 'ArrowDown':
      return group.wells[column + 1]?.wellId ?? null;
    case 'ArrowUp':
      return group.wells[column - 1]?.wellId ?? null;
    case 'ArrowRight':
      return across(groups[row + 1]);
    case 'ArrowLeft':
      return across(groups[row - 1]);
    case 'Home':
      return groups[0]?.wells[0]?.wellId ?? null;
    case 'End':
      return groups.at(-1)?.wells.at(-1)?.wellId ?? null;
    default:
      return null;
  }
}
