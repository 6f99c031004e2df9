import {
  Button,
  Menu,
  MenuItem,
  MenuList,
  MenuPopover,
  MenuTrigger,
  Tooltip,
} from '@fluentui/react-components';
import { ArrowDownload16Regular, Table16Regular } from '@fluentui/react-icons';
import type { RefObject } from 'react';
import { useSay } from '../feedback/toasts';
import { download, fileNameOf } from '../table/download';
import { tableText } from '../table/table-text';
import type { FigureTable } from './figure';
import { pictureOf } from './picture';

type Props<Row extends object> = {
  title: string;
  table?: FigureTable<Row>;
  asTable: boolean;
  setAsTable: (on: boolean) => void;
  body: RefObject<HTMLDivElement | null>;
  picture?: (kind: 'png' | 'svg') => Promise<Blob>;
};

/** "As table", copy, PNG, SVG and CSV of a figure. */
export function FigureTools<Row extends object>({
  title,
  table,
  asTable,
  setAsTable,
  body,
  picture,
}: Props<Row>) {
  const say = useSay();
  const draw = picture ?? ((kind: 'png' | 'svg') => pictureOf(body.current, kind));
  const save = (kind: 'png' | 'svg') =>
    draw(kind).then(
      (blob) => download(fileNameOf(title, kind), blob),
      (error: unknown) => say('The picture could not be made', String(error), 'error'),
    );
  const copy = async () => {
    if (!table) return;
    await navigator.clipboard.writeText(tableText(table.columns, table.rows, '\t'));
    say('Copied', 'The data of the figure, ready to paste into a spreadsheet.');
  };
  return (
    <span className="figure-tools sl-noprint">
      {table && (
        <Tooltip content={asTable ? 'As figure' : 'As table'} relationship="label">
          <Button
            size="small"
            appearance="subtle"
            aria-label={`${title} as ${asTable ? 'figure' : 'table'}`}
            aria-pressed={asTable}
            icon={<Table16Regular />}
            onClick={() => setAsTable(!asTable)}
          />
        </Tooltip>
      )}
      <Menu>
        <MenuTrigger disableButtonEnhancement>
          <Button
            size="small"
            appearance="subtle"
            aria-label={`Save ${title}`}
            icon={<ArrowDownload16Regular />}
          />
        </MenuTrigger>
        <MenuPopover>
          <MenuList>
            {table && (
              <MenuItem
                onClick={() =>
                  void copy().catch(() => say('The browser refused to copy', undefined, 'warning'))
                }
              >
                Copy the data
              </MenuItem>
            )}
            {table && (
              <MenuItem
                onClick={() => download(fileNameOf(title, 'csv'), tableText(table.columns, table.rows, ','))}
              >
                CSV
              </MenuItem>
            )}
            {!asTable && <MenuItem onClick={() => void save('png')}>PNG</MenuItem>}
            {!asTable && <MenuItem onClick={() => void save('svg')}>SVG</MenuItem>}
          </MenuList>
        </MenuPopover>
      </Menu>
    </span>
  );
}
