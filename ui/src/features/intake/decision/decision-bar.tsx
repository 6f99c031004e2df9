import { Button, Link as FluentLink } from '@fluentui/react-components';
import {
  ArrowReply20Regular,
  CheckmarkCircle20Regular,
  DocumentArrowUp20Regular,
  Prohibited20Regular,
} from '@fluentui/react-icons';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { usePerson } from '../../../shared/api/session';
import { useSay } from '../../../shared/feedback/toasts';
import { formatDate } from '../../../shared/number/time';
import { useNarrow } from '../../../shared/theme/colour-mode';
import { claim, decide, handIn, release, withdraw } from '../changes';
import type { Bench } from '../use-bench';
import { ApproveDialog } from './approve-dialog';
import { standing, whyNotApprove, whyNotSubmit } from './standing';

const OVER = ['approved', 'declined', 'withdrawn'];

/** Always at the foot: how the submission stands, and the next step that the person may take. */
export function DecisionBar({ bench }: { bench: Bench }) {
  const { detail } = bench;
  const own = detail.contributor.id === usePerson().id;
  if (OVER.includes(detail.state)) return <Outcome bench={bench} />;
  return own ? <ContributorBar bench={bench} /> : <StewardBar bench={bench} />;
}

function Outcome({ bench: { detail } }: { bench: Bench }) {
  const last = detail.decisions.at(-1);
  const { dataset } = detail;
  return (
    <Bar>
      <p>
        {last && (
          <>
            <b>
              {last.by.name} {last.decision === 'approve' ? 'approved' : `${last.decision}d`} it on{' '}
              {formatDate(last.at)}.
            </b>{' '}
          </>
        )}
        {!last && <b>It was withdrawn.</b>}
        {last?.reason && <span className="sl-muted">{last.reason} </span>}
        {dataset && (
          <>
            It is{' '}
            <Link to={`/holdings/${dataset.slug}/versions/${dataset.versionNumber}`}>
              version {dataset.versionNumber} of {dataset.title}
            </Link>
            .
          </>
        )}
      </p>
    </Bar>
  );
}

function ContributorBar({ bench }: { bench: Bench }) {
  const { detail, changing, askReason, openPanel } = bench;
  const say = useSay();
  const { rights, state, missingMetadata, decisions } = detail;
  const working = state === 'draft' || state === 'returned';
  const why = working ? whyNotSubmit(detail) : null;
  const returned = state === 'returned' ? decisions.at(-1) : undefined;
  const submit = async () => {
    if (await changing.change(handIn()))
      say('Submitted', 'The stewards are told; you are told of their decision.');
  };
  return (
    <Bar onCtrlEnter={working && rights.maySubmit ? () => void submit() : undefined}>
      <p>
        {returned && (
          <span className="decision-returned">
            {returned.by.name} returned it: {returned.reason}{' '}
          </span>
        )}
        <b>{working ? standing(detail) : waitingWords(detail)}</b>{' '}
        <span className="sl-muted">
          {why}{' '}
          {working && missingMetadata.length > 0 && (
            <FluentLink inline as="button" onClick={() => openPanel('metadata', missingMetadata[0])}>
              Open the form
            </FluentLink>
          )}
        </span>
      </p>
      <span className="sl-grow" />
      <div className="decision-acts">
        {state !== 'in-review' && (
          <Button
            disabled={changing.busy}
            onClick={() =>
              askReason({
                title: `Withdraw ${detail.number}?`,
                act: 'Withdraw',
                note: 'It stays readable to you, with all mends, and leaves the queue.',
                send: (reason) => changing.change(withdraw(reason)),
              })
            }
          >
            Withdraw
          </Button>
        )}
        {working && (
          <Button
            appearance="primary"
            icon={<DocumentArrowUp20Regular />}
            disabled={!rights.maySubmit || changing.busy}
            onClick={() => void submit()}
          >
            Submit
          </Button>
        )}
      </div>
    </Bar>
  );
}

const waitingWords = ({ reviewer, state }: Bench['detail']) =>
  state === 'in-review' && reviewer ? `${reviewer.name} is vetting it.` : 'It waits for a steward.';

function StewardBar({ bench }: { bench: Bench }) {
  const { detail, changing, askReason } = bench;
  const narrow = useNarrow();
  const me = usePerson().id;
  const [approving, setApproving] = useState(false);
  const { rights, state, reviewer, queries } = detail;
  const examined = state === 'submitted' || state === 'in-review';
  if (!examined)
    return (
      <Bar>
        <p>
          <b>{standing(detail)}</b> <span className="sl-muted">It is with its contributor.</span>
        </p>
      </Bar>
    );
  const why = whyNotApprove(detail);
  const mayApprove = rights.mayDecide && why === null;
  const icon = (sign: React.JSX.Element) => (narrow ? undefined : sign);
  const refuse = (decision: 'return' | 'decline') =>
    askReason({
      title:
        decision === 'return'
          ? `Return ${detail.number} to ${detail.contributor.name}?`
          : `Decline ${detail.number}?`,
      act: decision === 'return' ? 'Return' : 'Decline',
      note:
        decision === 'return'
          ? 'They read your reason and your queries, mend, and submit again.'
          : 'It ends here: declined data enter no version. The contributor reads your reason.',
      send: (reason) => changing.change(decide({ decision, reason })),
    });
  return (
    <Bar onCtrlEnter={mayApprove ? () => setApproving(true) : undefined}>
      <p>
        <b>{standing(detail)}</b> <span className="sl-muted">{why}</span>
      </p>
      <span className="sl-grow" />
      <div className="decision-acts">
        {rights.mayClaim && (
          <Button disabled={changing.busy} onClick={() => void changing.change(claim())}>
            Take
          </Button>
        )}
        {state === 'in-review' && reviewer?.id === me && (
          <Button disabled={changing.busy} onClick={() => void changing.change(release())}>
            Release
          </Button>
        )}
        <Button
          icon={icon(<Prohibited20Regular />)}
          disabled={!rights.mayDecide || changing.busy}
          onClick={() => refuse('decline')}
        >
          Decline
        </Button>
        <Button
          icon={icon(<ArrowReply20Regular />)}
          appearance={mayApprove ? 'secondary' : 'primary'}
          disabled={!rights.mayDecide || changing.busy}
          onClick={() => refuse('return')}
        >
          {returnWord(queries.length, narrow)}
        </Button>
        <Button
          icon={icon(<CheckmarkCircle20Regular />)}
          appearance={mayApprove ? 'primary' : 'secondary'}
          disabled={!mayApprove || changing.busy}
          onClick={() => setApproving(true)}
        >
          Approve
        </Button>
      </div>
      {approving && <ApproveDialog bench={bench} onClose={() => setApproving(false)} />}
    </Bar>
  );
}

function returnWord(queries: number, narrow: boolean): string {
  if (queries === 0) return 'Return';
  return narrow ? `Return (${queries})` : `Return with ${queries === 1 ? '1 query' : `${queries} queries`}`;
}

function Bar({ children, onCtrlEnter }: { children: React.ReactNode; onCtrlEnter?: () => void }) {
  return (
    <section
      className="decision-bar"
      aria-label="Next step"
      onKeyDown={(event) => event.key === 'Enter' && event.ctrlKey && onCtrlEnter?.()}
    >
      {children}
    </section>
  );
}
