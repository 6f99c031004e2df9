import { Button } from '@fluentui/react-components';
import { ArrowClockwise20Regular, ErrorCircle20Filled } from '@fluentui/react-icons';
import type { ReactNode } from 'react';
import { toApiProblem } from '../api/api-problem';
import './feedback.css';

type Props = {
  error: unknown;
  kept?: string;
  retry?: () => void;
  actions?: ReactNode;
  fields?: readonly string[];
};

/** What happened, what was kept, and a way on. Faults of `fields` are left out: they stand at their fields. */
export function ErrorState({ error, kept, retry, actions, fields = [] }: Props) {
  const problem = toApiProblem(error);
  const others = problem.besides(fields);
  return (
    <div className="error-state" role="alert">
      <h2>
        <ErrorCircle20Filled aria-hidden />
        {problem.title}
      </h2>
      <p>
        {problem.detail} {kept}
      </p>
      {others.length > 0 && (
        <ul>
          {others.map((fault) => (
            <li key={`${fault.pointer ?? fault.field ?? ''}${fault.message}`}>{fault.message}</li>
          ))}
        </ul>
      )}
      {(retry || actions) && (
        <div className="sl-row">
          {retry && (
            <Button size="small" appearance="primary" icon={<ArrowClockwise20Regular />} onClick={retry}>
              Try again
            </Button>
          )}
          {actions}
        </div>
      )}
      {problem.reference && (
        <p className="sl-small">Reference {problem.reference}, for whoever keeps the service.</p>
      )}
    </div>
  );
}
