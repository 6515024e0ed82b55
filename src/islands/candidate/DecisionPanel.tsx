import { useRef, useState } from 'react';
import type { CandidateView } from '../../contracts/candidate';
import type { DecisionAction, DecisionRecord, DecisionState } from '../../contracts/decisions';
import { asApiError, requestJson, type ApiError } from '../api';
import { Button } from '../Button';
import { ErrorNote } from '../ErrorNote';
import { DecisionForm } from './DecisionForm';
import { DecisionHistory } from './DecisionHistory';
import { actionLabels, currentOf, offeredActions, stateLabels } from './decisionWords';

export interface DecisionPanelProps {
  catalystId: string;
  code: string;
  decision: CandidateView['decision'];
  may: CandidateView['may'];
}

interface Decided {
  state: DecisionState;
  version: number;
  history: DecisionRecord[];
}

/** Where a candidate stands, the steps that the person may take, and how it came here. */
export function DecisionPanel({ catalystId, code, decision, may }: DecisionPanelProps) {
  const [now, setNow] = useState<Decided>(decision);
  const [action, setAction] = useState<DecisionAction | null>(null);
  const [reason, setReason] = useState('');
  const [fault, setFault] = useState<string | null>(null);
  const [saving, setSaving] = useState(false);
  const [error, setError] = useState<ApiError | null>(null);
  const [notice, setNotice] = useState('');
  const stands = useRef<HTMLParagraphElement>(null);
  const offered = offeredActions(now.state, may);

  /** Back to where the candidate stands, so that the keyboard is not left in a form that is gone. */
  const close = () => {
    setAction(null);
    stands.current?.focus();
  };

  const submit = async () => {
    if (action === null) return;
    if (reason.trim().length < 3) {
      setFault('Say why in a few words; it is kept in the history.');
      return;
    }
    setSaving(true);
    setError(null);
    setFault(null);
    try {
      const path = `/api/v1/candidates/${encodeURIComponent(catalystId)}/decisions`;
      const answer = await requestJson<Decided>(path, {
        method: 'POST',
        json: { action, reason: reason.trim(), version: now.version },
      });
      setNow(answer);
      setNotice(`${code} is now ${stateLabels[answer.state]}.`);
      setReason('');
      close();
    } catch (thrown) {
      const refused = asApiError(thrown);
      const current = currentOf(refused);
      if (current) {
        const { state, version, last } = current;
        setNow({ state, version, history: last ? [last, ...now.history] : now.history });
        // The step may no longer lead anywhere; the reason stays for whichever comes next.
        if (!offeredActions(state, may).includes(action)) setAction(null);
      }
      setFault(refused.errors.find(({ path: at }) => at === '/reason')?.message ?? null);
      setError(refused);
    } finally {
      setSaving(false);
    }
  };

  return (
    <section aria-label={`Decision on ${code}`} className="space-y-4">
      <div>
        <h2 className="text-quiet text-[13px] font-normal">Decision</h2>
        <p
          ref={stands}
          tabIndex={-1}
          className="text-[18px] leading-7 font-semibold outline-none first-letter:uppercase"
        >
          {stateLabels[now.state]}
        </p>
        <p aria-live="polite" className="sr-only">
          {notice}
        </p>
      </div>
      {error && <ErrorNote error={error} />}
      {action === null ? (
        <div className="flex flex-wrap gap-2">
          {offered.map((one, index) => (
            <Button
              key={one}
              kind={index === 0 && one !== 'reopen' ? 'main' : 'plain'}
              onClick={() => setAction(one)}
            >
              {actionLabels[one]}
            </Button>
          ))}
          {offered.length === 0 && (
            <p className="text-quiet text-[13.5px]">
              {may.nominate
                ? 'The next step is the group leader’s.'
                : 'You can read this candidate; nominating takes the role analyst.'}
            </p>
          )}
        </div>
      ) : (
        <DecisionForm
          code={code}
          action={action}
          reason={reason}
          saving={saving}
          fault={fault}
          onReason={setReason}
          onSubmit={() => void submit()}
          onCancel={() => {
            setFault(null);
            close();
          }}
        />
      )}
      <div>
        <h3 className="text-quiet mb-1 text-[13px] font-normal">History</h3>
        <DecisionHistory history={now.history} />
      </div>
    </section>
  );
}
