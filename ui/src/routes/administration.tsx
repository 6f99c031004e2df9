import type { PersonView } from '@siltlight/common/wire/people';
import { useQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { HealthList } from '../features/people/health-list';
import { InviteForm } from '../features/people/invite-form';
import { PersonForm } from '../features/people/person-form';
import { peopleQuery } from '../features/people/queries';
import { useSession } from '../shared/api/session';
import { Figure } from '../shared/figure/figure';
import { JobCard } from '../shared/jobs/job-card';
import { activeJobsQuery } from '../shared/jobs/queries';
import { counted } from '../shared/number/format';
import { formatDate } from '../shared/number/time';
import { Page } from '../shared/page/page';
import { StateTag } from '../shared/page/state-tag';
import type { DataColumn } from '../shared/table/column';
import { DataTable } from '../shared/table/data-table';
import '../features/people/people.css';

export const loader = (client: QueryClient) => () => client.ensureQueryData(peopleQuery);

const columns: DataColumn<PersonView>[] = [
  { id: 'name', header: 'Name', value: (row) => row.name, cell: (row) => <b>{row.name}</b> },
  { id: 'email', header: 'E-mail', value: (row) => row.email, wideOnly: true },
  { id: 'roles', header: 'Roles', value: (row) => row.roles.join(', ') },
  { id: 'state', header: 'State', value: (row) => row.state, cell: (row) => <StateTag state={row.state} /> },
  {
    id: 'since',
    header: 'Since',
    value: (row) => row.createdAt,
    cell: (row) => formatDate(row.createdAt),
    wideOnly: true,
  },
];

export default function Administration() {
  const { data: people } = useSuspenseQuery(peopleQuery);
  const { demo } = useSession();
  const jobs = useQuery(activeJobsQuery).data ?? [];
  const [params, setParams] = useSearchParams();
  const picked = people.find((person) => person.id === params.get('person'));
  const pick = (person: PersonView) =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        next.set('person', person.id);
        return next;
      },
      { preventScrollReset: true },
    );
  return (
    <Page
      title="Administration"
      crumbs={[{ label: 'Administration' }]}
      sub={counted(people.length, 'person', 'people')}
    >
      <div className="administration">
        <div>
          <Figure plain title="People" sub="pick one to change their roles">
            <DataTable
              bare
              roomy
              filterable
              caption="People"
              address="people-"
              columns={columns}
              rows={people}
              rowKey={(person) => person.id}
              startSort="name"
              selectedKey={picked?.id ?? null}
              onSelect={pick}
              empty={null}
            />
          </Figure>
          <Figure plain title="Your jobs" sub="in progress">
            {jobs.length === 0 && <p className="sl-13 sl-muted">Nothing runs.</p>}
            {jobs.map((job) => (
              <JobCard key={job.id} job={job} />
            ))}
          </Figure>
        </div>
        <div>
          {picked && (
            <Figure plain title="Roles">
              <PersonForm key={`${picked.id} ${picked.version}`} person={picked} />
            </Figure>
          )}
          <Figure plain title="Invite" sub="a link comes by mail">
            <InviteForm />
          </Figure>
          <Figure
            plain
            title="Mail, storage, database"
            sub="asked every 20 seconds"
            note={demo && <Link to="/mailbox">All mail of the demo</Link>}
          >
            <HealthList />
          </Figure>
        </div>
      </div>
    </Page>
  );
}
