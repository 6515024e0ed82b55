import { useEffect, useId, useRef, type SubmitEvent } from 'react';
import type { DecisionAction } from '../../contracts/decisions';
import { Button } from '../Button';
import { actionLabels } from './decisionWords';
import { ScaleUpCaution } from './ScaleUpCaution';

export interface DecisionFormProps {
  code: string;
  action: DecisionAction;
  reason: string;
  saving: boolean;
  /** What is wrong with the reason; null when nothing is. */
  fault: string | null;
  onReason: (reason: string) => void;
  onSubmit: () => void;
  onCancel: () => void;
}

const questions: Record<DecisionAction, string> = {
  nominate: 'Why should it be decided on?',
  'take-to-scale-up': 'Why this one, on which numbers?',
  wait: 'What is it waiting for?',
  'set-aside': 'Why is it set aside?',
  reopen: 'What has changed?',
};

/** Asks for the reason of one step; the reason is kept in the history. */
export function DecisionForm(props: DecisionFormProps) {
  const { code, action, reason, saving, fault, onReason, onSubmit, onCancel } = props;
  const box = useRef<HTMLTextAreaElement>(null);
  const id = useId();
  useEffect(() => box.current?.focus(), [action]);
  const submit = (event: SubmitEvent) => {
    event.preventDefault();
    onSubmit();
  };
  return (
    <form
      onSubmit={submit}
      className="space-y-3"
      aria-label={`${actionLabels[action]}: ${code}`}
      onKeyDown={(event) => event.key === 'Escape' && onCancel()}
    >
      {action === 'take-to-scale-up' && <ScaleUpCaution />}
      <div>
        <label htmlFor={id} className="font-semibold">
          {questions[action]}
        </label>
        <textarea
          id={id}
          ref={box}
          rows={3}
          maxLength={2000}
          value={reason}
          aria-invalid={fault !== null}
          aria-describedby={fault ? `${id}-fault` : undefined}
          onChange={(event) => onReason(event.target.value)}
          className="border-rule bg-sheet focus-visible:outline-accent mt-1 block w-full rounded-[3px] border px-2 py-1.5 focus-visible:outline-2"
        />
        {fault && (
          <p id={`${id}-fault`} className="text-refusal text-[13px]">
            {fault}
          </p>
        )}
      </div>
      <div className="flex flex-wrap gap-2">
        <Button kind="main" type="submit" disabled={saving}>
          {saving ? 'Saving…' : actionLabels[action]}
        </Button>
        <Button onClick={onCancel} disabled={saving}>
          Cancel
        </Button>
      </div>
    </form>
  );
}
