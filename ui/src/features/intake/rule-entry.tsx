import { formatNumber } from '../../shared/number/format';
import type { RuleEntry } from './queries';
import { SeverityIcon, type Severity } from './severity';

/** "ageStepKa" reads as "age step ka". */
const limitName = (key: string) => key.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();

const decimalsOf = (value: number) => Math.min(8, String(value).split('.')[1]?.length ?? 0);

/** One rule: what it finds, why that matters, its limits and its source, and whether it runs. */
export function RuleEntryView({ rule, picked }: { rule: RuleEntry; picked: boolean }) {
  const limits = Object.entries(rule.limits);
  return (
    <li
      id={rule.id}
      tabIndex={-1}
      className={['rule', picked && 'picked', rule.notRun !== null && 'not-run'].filter(Boolean).join(' ')}
    >
      <span className="rule-id">{rule.id}</span>
      <div>
        <h3>
          <SeverityIcon severity={rule.severity as Severity} />
          {rule.title}
        </h3>
        <p>{rule.why}</p>
        {limits.length > 0 && (
          <p className="sl-small sl-muted">
            Limits:{' '}
            {limits
              .map(
                ([key, value]) => `${limitName(key)} ${formatNumber(value, { decimals: decimalsOf(value) })}`,
              )
              .join(', ')}
          </p>
        )}
        <p className="sl-small sl-muted">Source: {rule.source}</p>
        {rule.notRun !== null && <p className="rule-not-run">Not run: {rule.notRun}</p>}
      </div>
    </li>
  );
}
