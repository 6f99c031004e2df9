import { Button, Tooltip } from '@fluentui/react-components';
import { ArrowDownload16Regular, Copy16Regular } from '@fluentui/react-icons';
import { useSay } from '../feedback/toasts';
import { counted } from '../number/format';
import type { DataColumn } from './column';
import { download, fileNameOf } from './download';
import { tableText } from './table-text';

type Props<Row> = { title: string; columns: readonly DataColumn<Row>[]; rows: readonly Row[] };

/** Copy for a spreadsheet, and download as CSV. */
export function TableTools<Row>({ title, columns, rows }: Props<Row>) {
  const say = useSay();
  const copy = () =>
    navigator.clipboard.writeText(tableText(columns, rows, '\t')).then(
      () => say('Copied', `${counted(rows.length, 'row')}, ready to paste into a spreadsheet.`),
      () => say('The browser refused to copy', 'Use the download instead.', 'warning'),
    );
  return (
    <span className="figure-tools sl-noprint">
      <Tooltip content="Copy the table" relationship="label">
        <Button
          size="small"
          appearance="subtle"
          aria-label={`Copy ${title}`}
          icon={<Copy16Regular />}
          onClick={() => void copy()}
        />
      </Tooltip>
      <Tooltip content="Download as CSV" relationship="label">
        <Button
          size="small"
          appearance="subtle"
          aria-label={`Download ${title} as CSV`}
          icon={<ArrowDownload16Regular />}
          onClick={() => download(fileNameOf(title, 'csv'), tableText(columns, rows, ','))}
        />
      </Tooltip>
    </span>
  );
}
