import { submissionState } from '@siltlight/common/wire/submissions';
import { Button, Select, Tab, TabList } from '@fluentui/react-components';
import { ArrowDownload20Regular, ArrowUpload20Regular } from '@fluentui/react-icons';
import { useInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useLocation, useNavigate, useSearchParams } from 'react-router-dom';
import { listQuery, templateAddress, type ListView } from '../features/intake/queries';
import { ownColumns, stewardColumns } from '../features/intake/submissions-list';
import { DropAnywhere } from '../features/intake/upload/drop-anywhere';
import { UploadDialog } from '../features/intake/upload/upload-dialog';
import { useHasRole, usePerson } from '../shared/api/session';
import { EmptyState } from '../shared/feedback/empty-state';
import { ErrorState } from '../shared/feedback/error-state';
import { LoadingRows } from '../shared/feedback/loading';
import { counted } from '../shared/number/format';
import { Page } from '../shared/page/page';
import { DataTable } from '../shared/table/data-table';
import '../features/intake/intake.css';

const views = { mine: 'My submissions', queue: 'Queue', all: 'All' } as const;
const stateWords: Record<string, string> = { 'in-review': 'in review' };

function useListView(isSteward: boolean) {
  const [params, setParams] = useSearchParams();
  const asked = params.get('view') ?? '';
  const view = isSteward && (asked === 'queue' || asked === 'all') ? asked : 'mine';
  const change = (next: Partial<ListView>) =>
    setParams(
      (before) => {
        const after = new URLSearchParams(before);
        for (const [name, value] of Object.entries(next)) {
          if (value) after.set(name, value);
          else after.delete(name);
        }
        return after;
      },
      { preventScrollReset: true },
    );
  return [{ view, state: view === 'queue' ? '' : (params.get('state') ?? '') }, change] as const;
}

export default function Intake() {
  const person = usePerson();
  const isSteward = useHasRole('steward');
  const navigate = useNavigate();
  const { pathname, search } = useLocation();
  const [file, setFile] = useState<File | null>(null);
  const uploading = pathname.endsWith('/new');
  const [list, change] = useListView(isSteward);
  const open = (next: File | null) => {
    setFile(next);
    void navigate(`/intake/new${search}`, { preventScrollReset: true });
  };
  return (
    <DropAnywhere onFile={open}>
      <Page
        title="Intake"
        crumbs={[{ label: 'Intake' }]}
        sub="spreadsheets on their way to vetted datasets"
        actions={
          <>
            <Button as="a" href={templateAddress('dust-flux')} icon={<ArrowDownload20Regular />}>
              Template
            </Button>
            <Button appearance="primary" icon={<ArrowUpload20Regular />} onClick={() => open(null)}>
              Upload a spreadsheet
            </Button>
          </>
        }
      >
        <div className="intake-bar">
          {isSteward && (
            <TabList
              size="small"
              aria-label="Which submissions"
              selectedValue={list.view}
              onTabSelect={(_, data) => change({ view: data.value as ListView['view'] })}
            >
              {Object.entries(views).map(([value, label]) => (
                <Tab key={value} value={value}>
                  {label}
                </Tab>
              ))}
            </TabList>
          )}
          <span className="sl-grow" />
          {list.view !== 'queue' && (
            <Select
              size="small"
              aria-label="State"
              value={list.state}
              onChange={(_, data) => change({ state: data.value })}
            >
              <option value="">any state</option>
              {submissionState.options.map((state) => (
                <option key={state} value={state}>
                  {stateWords[state] ?? state}
                </option>
              ))}
            </Select>
          )}
          <Link to="/intake/rules" className="sl-13">
            What is checked
          </Link>
        </div>
        <List list={list} personId={person.id} onUpload={() => open(null)} />
      </Page>
      {uploading && (
        <UploadDialog
          file={file}
          onFile={setFile}
          onClose={() => void navigate(`/intake${search}`, { preventScrollReset: true })}
        />
      )}
    </DropAnywhere>
  );
}

function List({ list, personId, onUpload }: { list: ListView; personId: string; onUpload: () => void }) {
  const { data, error, refetch, hasNextPage, fetchNextPage, isFetchingNextPage } = useInfiniteQuery(
    listQuery(list),
  );
  if (error && !data) return <ErrorState error={error} retry={() => void refetch()} />;
  if (!data) return <LoadingRows rows={8} label="Loading the submissions" />;
  const rows = data.pages.flatMap((page) => page.items);
  const total = data.pages[0]?.total ?? rows.length;
  return (
    <>
      <DataTable
        roomy
        filterable={rows.length > 0}
        caption={list.view === 'queue' ? 'To vet, oldest first' : views[list.view]}
        sub={counted(total, 'submission')}
        address="list-"
        columns={list.view === 'mine' ? ownColumns : stewardColumns(personId)}
        rows={rows}
        rowKey={(row) => row.id}
        empty={<Nothing list={list} onUpload={onUpload} />}
      />
      {hasNextPage && (
        <Button size="small" disabled={isFetchingNextPage} onClick={() => void fetchNextPage()}>
          Show more
        </Button>
      )}
    </>
  );
}

function Nothing({ list, onUpload }: { list: ListView; onUpload: () => void }) {
  if (list.view === 'queue')
    return <EmptyState title="Nothing waits for vetting.">What scientists submit appears here.</EmptyState>;
  if (list.state)
    return <EmptyState title="No submission is in this state.">Choose “any state” to see all.</EmptyState>;
  return (
    <EmptyState
      title="Nothing submitted yet."
      action={
        <Button appearance="primary" icon={<ArrowUpload20Regular />} onClick={onUpload}>
          Upload a spreadsheet
        </Button>
      }
      after={
        <>
          Or start from an empty table: <a href={templateAddress('dust-flux')}>take the template</a>.
        </>
      }
    >
      Drop a workbook or a text table anywhere on this page. Tables, headings and units are proposed; you
      correct them where they are wrong.
    </EmptyState>
  );
}
