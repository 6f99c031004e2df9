import { Button } from '@fluentui/react-components';
import { ChevronDown16Regular, ChevronRight16Regular } from '@fluentui/react-icons';
import type { FindingView } from '@siltlight/common/wire/submissions';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { actsOf, actsOfGroup, type FindingAct } from '../finding-acts';
import { placeOfFinding, placeWords } from '../places';
import { SeverityIcon } from '../severity';
import type { Bench } from '../use-bench';
import type { FindingGroup } from './group-findings';

const SHOWN_FIRST = 12;

type Props = { group: FindingGroup; bench: Bench; open: boolean; onToggle: () => void };

/** One rule and what it found. */
export function FindingGroupView({ group, bench, open, onToggle }: Props) {
  const [all, setAll] = useState(false);
  const { items } = group;
  const pickedAt = items.findIndex(({ key }) => key === bench.picked);
  const shown = all || pickedAt >= SHOWN_FIRST ? items : items.slice(0, SHOWN_FIRST);
  const Chevron = open ? ChevronDown16Regular : ChevronRight16Regular;
  const sheets = bench.detail.workbook.sheets.length;
  return (
    <li className={open ? 'finding-group open' : 'finding-group'}>
      <button type="button" className="finding-group-head" aria-expanded={open} onClick={onToggle}>
        <Chevron aria-hidden />
        <SeverityIcon severity={group.severity} />
        <b>{group.title}</b>
        <span className="sl-muted">{items.length}</span>
      </button>
      {!open && (
        <p className="finding-line">
          {placeWords(items[0]!, sheets)}: {items[0]!.message}
        </p>
      )}
      {open && (
        <>
          <div className="finding-acts">
            <Acts acts={actsOfGroup(group, bench)} />
            <Link to={`/intake/rules#${group.code}`} className="sl-small" aria-label={`Why: ${group.title}`}>
              Why
            </Link>
          </div>
          <ul>
            {shown.map((finding) => (
              <FindingItem key={finding.key} finding={finding} bench={bench} />
            ))}
          </ul>
          {shown.length < items.length && (
            <Button size="small" appearance="transparent" onClick={() => setAll(true)}>
              Show all {items.length}
            </Button>
          )}
        </>
      )}
    </li>
  );
}

function FindingItem({ finding, bench }: { finding: FindingView; bench: Bench }) {
  const place = placeWords(finding, bench.detail.workbook.sheets.length);
  const picked = finding.key === bench.picked;
  return (
    <li
      className={picked ? 'finding-item picked' : 'finding-item'}
      aria-current={picked || undefined}
      ref={picked ? scrollIntoSight : undefined}
    >
      <p>
        {placeOfFinding(finding, bench.detail.mapping) ? (
          <button type="button" className="finding-place" onClick={() => bench.pickFinding(finding)}>
            {place}
          </button>
        ) : (
          <b>{place}</b>
        )}
        {': '}
        {finding.waived ? <s>{finding.message}</s> : finding.message}
        {!finding.waived && finding.remedy && <span className="finding-remedy"> {finding.remedy}</span>}
      </p>
      {finding.waived ? (
        <p className="sl-small sl-muted">
          Waived by {finding.waived.by.name}: {finding.waived.reason}
        </p>
      ) : (
        <div className="finding-acts">
          <Acts acts={actsOf(finding, bench)} />
        </div>
      )}
    </li>
  );
}

const scrollIntoSight = (element: HTMLElement | null) => element?.scrollIntoView?.({ block: 'nearest' });

const Acts = ({ acts }: { acts: FindingAct[] }) =>
  acts.map(({ label, act }) => (
    <Button key={label} size="small" onClick={act}>
      {label}
    </Button>
  ));
