import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';
import { SearchBox } from '@fluentui/react-components';
import { rulesQuery } from '../features/intake/queries';
import { groupRules, ruleHolds } from '../features/intake/rules-by-stage';
import { RuleEntryView } from '../features/intake/rule-entry';
import { EmptyState } from '../shared/feedback/empty-state';
import { Page } from '../shared/page/page';
import '../features/intake/intake.css';

export const loader = (client: QueryClient) => () => client.ensureQueryData(rulesQuery);

export default function IntakeRules() {
  const { data: rules } = useSuspenseQuery(rulesQuery);
  const [params, setParams] = useSearchParams();
  const { hash } = useLocation();
  const find = params.get('find') ?? '';
  const picked = decodeURIComponent(hash.slice(1));
  useEffect(() => {
    const rule = picked ? document.getElementById(picked) : null;
    rule?.scrollIntoView({ block: 'center' });
    rule?.focus({ preventScroll: true });
  }, [picked]);
  const stages = groupRules(rules.filter((rule) => ruleHolds(rule, find)));
  const run = rules.filter((rule) => rule.notRun === null).length;
  return (
    <Page
      title="What is checked"
      crumbs={[{ label: 'Intake', to: '/intake' }, { label: 'Rules' }]}
      sub={`${rules.length} rules, ${run} run here, ${rules.length - run} do not and say why`}
    >
      <div className="rules-bar">
        <SearchBox
          size="small"
          aria-label="Find a rule"
          placeholder="Find a rule"
          value={find}
          onChange={(_, data) =>
            setParams(data.value ? { find: data.value } : {}, { replace: true, preventScrollReset: true })
          }
        />
      </div>
      {stages.length === 0 && (
        <EmptyState title="No rule fits.">Clear the field above to see all rules.</EmptyState>
      )}
      {stages.map(({ stage, title, when, entries, notRun }) => (
        <section key={stage} className="rules-stage" aria-label={title}>
          <h2>
            {title}
            <span className="sl-small sl-muted">
              {when}; {entries.length - notRun} run{notRun > 0 && `, ${notRun} not run`}
            </span>
          </h2>
          <ul>
            {entries.map((rule) => (
              <RuleEntryView key={rule.id} rule={rule} picked={rule.id === picked} />
            ))}
          </ul>
        </section>
      ))}
    </Page>
  );
}
