import type { CandidateWell } from '../../contracts/candidate';
export function WellFace({ well }: { well: CandidateWell }) {
  return <span className="size-5 rounded-full border">{well.analysis.conversion?.toFixed(1)}</span>;
}
