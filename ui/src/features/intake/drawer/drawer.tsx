import { Tab, TabList } from '@fluentui/react-components';
import { useState } from 'react';
import type { Bench } from '../use-bench';
import { FindingsList } from './findings-list';
import { MendsList } from './mends-list';
import { QueriesList } from './queries-list';

type TabName = 'findings' | 'queries' | 'mends';

/** Beside the grid: what the rules found, what was asked, what was mended. */
export function Drawer({ bench }: { bench: Bench }) {
  const [tab, setTab] = useState<TabName>('findings');
  const { detail, findings } = bench;
  return (
    <aside className="bench-drawer" aria-label="Findings, queries and mends">
      <div className="drawer-head">
        <TabList
          size="small"
          aria-label="In the drawer"
          selectedValue={tab}
          onTabSelect={(_, data) => setTab(data.value as TabName)}
        >
          <Tab value="findings">Findings {findings.data?.total ?? ''}</Tab>
          <Tab value="queries">Queries {detail.queries.length}</Tab>
          <Tab value="mends">Mends {detail.corrections.length}</Tab>
        </TabList>
        <span className="sl-grow" />
        <span className="drawer-keys">
          <button
            type="button"
            aria-label="Previous finding"
            title="Previous finding: ["
            onClick={() => bench.step(-1)}
          >
            <kbd>[</kbd>
          </button>
          <button
            type="button"
            aria-label="Next finding"
            title="Next finding: ]"
            onClick={() => bench.step(1)}
          >
            <kbd>]</kbd>
          </button>
        </span>
      </div>
      {tab === 'findings' && <FindingsList bench={bench} />}
      {tab === 'queries' && <QueriesList bench={bench} />}
      {tab === 'mends' && <MendsList bench={bench} />}
    </aside>
  );
}
