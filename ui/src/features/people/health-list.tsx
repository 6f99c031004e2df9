import { CheckmarkCircle16Filled, ErrorCircle16Filled } from '@fluentui/react-icons';
import { useQuery } from '@tanstack/react-query';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingRows } from '../../shared/feedback/loading';
import { healthQuery } from './queries';

const titles: Record<string, string> = {
  'database-write': 'Database takes writes',
  schema: 'Schema is the one expected',
  disk: 'Storage has room',
  outbox: 'Mail leaves the outbox',
};

/** What the service says about itself: database, storage, mail. */
export function HealthList() {
  const { data: checks, error, refetch } = useQuery(healthQuery);
  if (error) return <ErrorState error={error} retry={() => void refetch()} />;
  if (!checks) return <LoadingRows rows={4} label="Loading the state of the service" />;
  return (
    <ul className="health-list">
      {checks.map((check) => (
        <li key={check.name}>
          {check.ok ? (
            <CheckmarkCircle16Filled color="var(--slMoss)" aria-label="in order" />
          ) : (
            <ErrorCircle16Filled color="var(--slRust)" aria-label="failing" />
          )}
          <span>{titles[check.name] ?? check.name}</span>
          <span className="sl-muted">{check.detail}</span>
        </li>
      ))}
    </ul>
  );
}
