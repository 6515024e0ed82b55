import { useMemo } from 'react';
import type { CandidateView } from '../contracts/candidate';
import { ArrheniusSection } from './candidate/ArrheniusSection';
import { CandidateHeader } from './candidate/CandidateHeader';
import { DecisionPanel } from './candidate/DecisionPanel';
import { TagEditor } from './candidate/TagEditor';
import { useChosenWell } from './candidate/useChosenWell';
import { WellChooser } from './candidate/WellChooser';
import { WellFit } from './candidate/WellFit';
import { groupWells } from './candidate/wellGroups';

export interface CandidatePageProps {
  view: CandidateView;
  /** `?well=` of the address, so that the server draws the right one at once. */
  initialWellId?: string | null;
}

/** One candidate: what was found, on which readings, and what was decided. */
export function CandidatePage({ view, initialWellId = null }: CandidatePageProps) {
  const { wells, catalyst, campaign, screen } = view;
  const groups = useMemo(() => groupWells(wells), [wells]);
  const { chosen, choose } = useChosenWell(wells, initialWellId);
  const replicates = useMemo(() => {
    const group = groups.find((one) => chosen !== null && one.wells.includes(chosen));
    return (group?.wells ?? []).filter((well) => well !== chosen);
  }, [groups, chosen]);
  return (
    <div className="grid gap-x-12 gap-y-10 xl:grid-cols-[minmax(0,1fr)_17rem] xl:grid-rows-[auto_1fr]">
      <div className="min-w-0">
        <CandidateHeader view={view} />
      </div>
      <aside className="border-rule border-t pt-6 xl:col-start-2 xl:row-span-2 xl:row-start-1 xl:border-t-0 xl:border-l xl:pt-0 xl:pl-8">
        <div className="grid gap-x-12 gap-y-8 sm:max-xl:grid-cols-2 xl:sticky xl:top-7">
          <DecisionPanel
            catalystId={catalyst.id}
            code={catalyst.code}
            decision={view.decision}
            may={view.may}
          />
          <TagEditor
            catalystId={catalyst.id}
            code={catalyst.code}
            tags={view.tags}
            mayTag={view.may.tag}
          />
        </div>
      </aside>
      <div className="min-w-0 space-y-12">
        <section aria-labelledby="wells">
          <h2 id="wells" className="mb-2 text-[18px] font-semibold">
            Wells
          </h2>
          {chosen === null ? (
            <p className="text-quiet">
              The current analysis holds no well of {catalyst.code}. Analyse its screen again.
            </p>
          ) : (
            <>
              <WellChooser groups={groups} chosen={chosen.wellId} onChoose={choose} />
              <div className="mt-6">
                <WellFit
                  well={chosen}
                  replicates={replicates}
                  reactant={campaign.reactant}
                  fileName={screen.fileName}
                />
              </div>
            </>
          )}
        </section>
        <ArrheniusSection view={view} chosen={chosen?.wellId ?? ''} onChoose={choose} />
      </div>
    </div>
  );
}
