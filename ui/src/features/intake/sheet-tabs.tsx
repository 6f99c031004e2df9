import { Tab, TabList } from '@fluentui/react-components';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';

type Props = { detail: SubmissionDetail; sheet: string; onSheet: (sheet: string) => void };

/** The sheets of the workbook; those left alone say so. */
export function SheetTabs({ detail, sheet, onSheet }: Props) {
  const { sheets } = detail.workbook;
  if (sheets.length < 2) return null;
  const used = new Set(detail.mapping.tables.filter((table) => table.used).map((table) => table.sheet));
  return (
    <TabList
      size="small"
      className="sheet-tabs"
      aria-label="Sheets"
      selectedValue={sheet}
      onTabSelect={(_, data) => onSheet(String(data.value))}
    >
      {sheets.map(({ name }) => (
        <Tab key={name} value={name}>
          {name}
          {!used.has(name) && <span className="sl-small sl-muted"> left alone</span>}
        </Tab>
      ))}
    </TabList>
  );
}
