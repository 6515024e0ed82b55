import type { CandidateView } from '../../contracts/candidate';
import { candidateHref } from '../../contracts/links';
import { DecayMark } from '../DecayMark';
import { formatDay } from '../dates';
import { verdictWord } from '../../screening/decayMarks';
import { FigureText } from './FigureText';
import { cardFacts, compositionOf, headerFigures } from './headerFigures';
import { NextRuns } from './NextRuns';
import { Warnings } from './Warnings';

/** Who the candidate is, what was found, and the numbers that it is judged by. */
export function CandidateHeader({ view }: { view: CandidateView }) {
  const { catalyst, campaign, result, analysis, screen } = view;
  const linkTo = (id: string) => candidateHref(campaign.groupId, campaign.id, id);
  return (
    <header>
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h1 className="display">
          {catalyst.code}
          <span className="text-quiet ml-3 text-[18px] font-normal">{compositionOf(catalyst)}</span>
        </h1>
        <nav aria-label="Candidates beside this one" className="flex gap-4 print:hidden">
          {view.previous && (
            <a className="min-h-6" href={linkTo(view.previous.id)}>
              ← {view.previous.code}
            </a>
          )}
          {view.next && (
            <a className="min-h-6" href={linkTo(view.next.id)}>
              {view.next.code} →
            </a>
          )}
        </nav>
      </div>

      <div className="mt-4 flex items-start gap-4">
        <DecayMark
          verdict={result.verdict}
          order={result.order}
          height={34}
          silent
          className="text-accent mt-1"
        />
        <div className="max-w-[68ch]">
          <p className="text-lead font-semibold first-letter:uppercase">
            {verdictWord(result.verdict, result.order)}
          </p>
          <p>{view.explanation}</p>
        </div>
      </div>

      <dl className="mt-6 grid grid-cols-1 gap-x-8 gap-y-4 sm:grid-cols-2 xl:grid-cols-3">
        {headerFigures(view).map(({ name, at, figure, note }) => (
          <div key={name} className="border-rule border-t pt-2">
            <dt className="text-quiet text-[13px] leading-5 sm:min-h-10">
              {name}
              {at && <span className="block">{at}</span>}
            </dt>
            <dd className="m-0">
              {figure ? <FigureText figure={figure} /> : <span className="text-quiet">–</span>}
              {note && <span className="text-quiet block text-[13px] leading-5">{note}</span>}
            </dd>
          </div>
        ))}
      </dl>

      <Warnings warnings={view.warnings} except={view.explanation} className="mt-6" />
      <NextRuns proposals={view.proposals} className="mt-6" />

      <p className="text-quiet mt-4 text-[13px] leading-5">
        {cardFacts(view).map(([name, value], index) => (
          <span key={name}>
            {index > 0 && ' · '}
            {name} <span className="text-ink">{value}</span>
          </span>
        ))}
      </p>
      <p className="text-quiet text-[13px] leading-5">
        From the analysis of {screen.name} that {analysis.requestedBy} made on{' '}
        {formatDay(analysis.finishedAt)}, engine {analysis.engine}.
      </p>
    </header>
  );
}
