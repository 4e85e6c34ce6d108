import { useEffect, useRef, useState } from 'react';
import { showState } from '@/components/islands/shared/state-chip';
import { Button } from '@/components/ui/Button';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { TextField } from '@/components/ui/TextField';
import { ACTIONS, decide, doneSentence, type DecisionAction, type Outcome, type Standing } from './decisions';

export interface DecisionPanelProps {
  readonly standing: Standing;
  readonly owner: string;
  readonly moduleId: number;
  /** A model of this module is in the catalogue now, and an approval would take its place. */
  readonly supersedes: boolean;
  /** Id of the chip at the head of the page that shows the state. */
  readonly chip: string;
}

const REASONS = {
  return: { label: 'What has to be mended', hint: 'The engineer gets this by mail and sees it on the bench.', button: 'Return' },
  withdraw: { label: 'Why it is withdrawn', hint: 'The engineer gets this by mail; it stays in the history.', button: 'Withdraw' },
} as const;

interface ReasonProps {
  action: keyof typeof REASONS;
  busy: boolean;
  error: string | null;
  onDecide: (reason: string) => void;
}

/** A reason and the decision that needs it; what is wrong with it stands beside the field, which then has the focus. */
function WithReason({ action, busy, error, onDecide }: ReasonProps) {
  const { label, hint, button } = REASONS[action];
  const [reason, setReason] = useState('');
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (error) form.current?.querySelector('textarea')?.focus();
  }, [error]);
  return (
    <form
      ref={form}
      className="flex flex-col gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        onDecide(reason);
      }}
    >
      <TextField label={label} description={hint} multiline rows={3} value={reason} onChange={setReason} error={error} isRequired />
      <div>
        <Button type="submit" isPending={busy}>
          {button}
        </Button>
      </div>
    </form>
  );
}

const Failure = ({ outcome }: { outcome: Extract<Outcome, { kind: 'lost' | 'failed' }> }) => (
  <div className="notice notice-attention" role="alert">
    <p>{outcome.sentence}</p>
    {outcome.kind === 'lost' && (
      <button type="button" className="btn btn-small mt-2" onClick={() => location.reload()}>
        Load it as it is now
      </button>
    )}
    {outcome.kind === 'failed' && outcome.signIn && (
      <p className="mt-2">
        <a href={`/sign-in?next=${encodeURIComponent(location.pathname)}`}>Sign in again</a>
      </p>
    )}
  </div>
);

function useDecision({ standing, owner, chip }: DecisionPanelProps) {
  const [now, setNow] = useState(standing);
  const [busy, setBusy] = useState<DecisionAction | null>(null);
  const [outcome, setOutcome] = useState<Outcome | null>(null);
  const [said, setSaid] = useState('');
  const press = async (action: DecisionAction, reason = '') => {
    if (busy) return;
    setBusy(action);
    setSaid('');
    const result = await decide(now, action, reason).finally(() => setBusy(null));
    setOutcome(result);
    if (result.kind !== 'done') return;
    setNow({ ...now, ...result.answer });
    setSaid(doneSentence(action, result.answer.state, owner));
    showState(chip, result.answer.state);
  };
  return { now, busy, outcome, said, press };
}

function Panel(props: DecisionPanelProps) {
  const { now, busy, outcome, said, press } = useDecision(props);
  const status = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (said) status.current?.focus();
  }, [said]);
  const actions = ACTIONS[now.state];
  // An approval has taken the place of the one that stood there.
  const supersedes = props.supersedes && now.version === props.standing.version;
  const reasonError = outcome?.kind === 'field' ? outcome.sentence : null;
  return (
    <div className="flex flex-col gap-3">
      <div ref={status} role="status" tabIndex={-1} className={said ? 'notice notice-approved' : 'sr-only'}>
        {said && (
          <>
            <p>{said}</p>
            <p className="mt-1 flex flex-wrap gap-x-4">
              <a href="/review">Back to the queue</a>
              {now.state === 'approved' && <a href={`/modules/${props.moduleId}`}>The module in the catalogue</a>}
            </p>
          </>
        )}
      </div>
      {(outcome?.kind === 'lost' || outcome?.kind === 'failed') && <Failure outcome={outcome} />}
      {actions.includes('approve') && (
        <div>
          <Button variant="primary" isPending={busy === 'approve'} onPress={() => void press('approve')}>
            Approve
          </Button>
          <p className="hint mt-1">
            Freezes the reading under its hash and puts its model in the catalogue
            {supersedes ? ', in place of the one that stands there now.' : '.'}
          </p>
        </div>
      )}
      {actions.includes('restore') && (
        <div>
          <Button variant="primary" isPending={busy === 'restore'} onPress={() => void press('restore')}>
            Restore
          </Button>
          <p className="hint mt-1">
            {supersedes
              ? 'A newer reading stands in the catalogue, so this one comes back as superseded.'
              : 'Brings its model back into the catalogue as it was.'}
          </p>
        </div>
      )}
      {(['return', 'withdraw'] as const)
        .filter((action) => actions.includes(action))
        .map((action) => (
          <WithReason
            key={action}
            action={action}
            busy={busy === action}
            error={reasonError}
            onDecide={(reason) => void press(action, reason)}
          />
        ))}
    </div>
  );
}

/** Decides on a reading: approve or return what was handed in, withdraw what is approved, restore what was withdrawn. */
export const DecisionPanel = (props: DecisionPanelProps) => (
  <ErrorBoundary>
    <Panel {...props} />
  </ErrorBoundary>
);
