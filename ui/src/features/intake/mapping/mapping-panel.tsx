import { Button } from '@fluentui/react-components';
import { Cautions } from '../../../shared/feedback/cautions';
import { ErrorState } from '../../../shared/feedback/error-state';
import { counted } from '../../../shared/number/format';
import { PanelHead } from '../panel-head';
import type { Bench } from '../use-bench';
import { ConstantsTable } from './constants-table';
import { ColumnsTable } from './columns-table';
import { TablesList } from './tables-list';
import type { MappingDraft } from './use-mapping-draft';

type Props = { bench: Bench; draft: MappingDraft; onClose: () => void };

/** Where the tables lie and what their columns mean: the proposal, and its correction by a person. */
export function MappingPanel({ bench, draft, onClose }: Props) {
  const { detail, changing, place } = bench;
  const { mayEdit } = detail.rights;
  const { faults, missing, dirty } = draft;
  return (
    <aside className="bench-panel wide" aria-label="Mapping">
      <PanelHead
        title="Mapping"
        sub={mayEdit ? 'proposed; correct it where it is wrong' : 'as the contributor set it'}
        onClose={onClose}
      />
      <div className="panel-body">
        {changing.problem && dirty && (
          <ErrorState error={changing.problem} kept="Your corrections are still here." />
        )}
        {detail.workbook.readNotes.length > 0 && (
          <Cautions of={detail.workbook.readNotes} label="Notes from reading" />
        )}
        <fieldset disabled={!mayEdit} className="panel-fields">
          <TablesList
            draft={draft}
            cursor={place}
            sheets={detail.workbook.sheets}
            onSheet={(sheet) => bench.go({ ...place, sheet, row: 1 })}
          />
          <ColumnsTable
            draft={draft}
            sheet={place.sheet}
            onColumn={(column) => bench.go({ ...place, column })}
          />
          <ConstantsTable draft={draft} sheet={place.sheet} />
        </fieldset>
      </div>
      <footer className="panel-foot">
        <div>
          {missing.map(({ sheet, titles }) => (
            <p key={sheet} className="panel-missing">
              “{sheet}” gives no {titles.join(', ').toLowerCase()}: its rows cannot be used yet.
            </p>
          ))}
          {faults.length > 0 && (
            <p className="panel-fault">{counted(faults.length, 'place')} to put right above.</p>
          )}
          <CountsChange draft={draft} now={detail.counts} />
        </div>
        {mayEdit && (
          <div className="sl-row">
            <Button disabled={!dirty || changing.busy} onClick={draft.discard}>
              Discard
            </Button>
            <Button
              appearance="primary"
              disabled={!dirty || faults.length > 0 || changing.busy}
              onClick={() => void draft.apply()}
            >
              Apply
            </Button>
          </div>
        )}
      </footer>
    </aside>
  );
}

type Counts = Bench['detail']['counts'];

function CountsChange({ draft: { before, dirty }, now }: { draft: MappingDraft; now: Counts }) {
  if (dirty || !before) return null;
  const parts: [string, number, number][] = [
    ['usable rows', before.usableRows, now.usableRows],
    ['errors', before.errors, now.errors],
    ['warnings', before.warnings, now.warnings],
  ];
  return (
    <p className="sl-13" role="status">
      Applied:{' '}
      {parts
        .map(([name, was, is]) => (was === is ? `${is} ${name}, as before` : `${was} to ${is} ${name}`))
        .join('; ')}
      .
    </p>
  );
}
