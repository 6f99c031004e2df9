import { Menu, MenuItem, MenuList, MenuPopover } from '@fluentui/react-components';
import { takeBack } from './changes';
import { askToLeaveOut } from './finding-acts';
import { rowKindOf } from './places';
import type { Bench } from './use-bench';

export type RowMenuAt = { rows: number[]; target: HTMLElement };

/** What can be done with the picked rows. */
export function RowMenu({ bench, at, onClose }: { bench: Bench; at: RowMenuAt; onClose: () => void }) {
  const { detail, place, changing, openQuery, openPanel } = bench;
  const { mayEdit, mayDecide } = detail.rights;
  const places = at.rows
    .filter((row) => rowKindOf(detail.mapping.tables, place.sheet, row) === 'data')
    .map((row) => ({ sheet: place.sheet, row }));
  const isOut = ({ row }: { row: number }) =>
    detail.leftOut.some((one) => one.sheet === place.sheet && one.row === row);
  const out = places.filter(isOut);
  const inside = places.filter((one) => !isOut(one));
  const reasons = [
    ...new Set(
      detail.leftOut
        .filter((one) => out.some(({ row }) => row === one.row && one.sheet === place.sheet))
        .map((one) => one.reason),
    ),
  ];
  const many = (rows: unknown[]) => (rows.length === 1 ? 'the row' : `${rows.length} rows`);
  return (
    <Menu
      open
      onOpenChange={(_, data) => !data.open && onClose()}
      positioning={{ target: at.target, position: 'below', align: 'start' }}
    >
      <MenuPopover>
        <MenuList>
          {mayEdit && inside.length > 0 && (
            <MenuItem onClick={() => askToLeaveOut(bench, inside)}>Leave {many(inside)} out …</MenuItem>
          )}
          {mayEdit && out.length > 0 && (
            <MenuItem onClick={() => void changing.change(takeBack(out))}>Take {many(out)} back in</MenuItem>
          )}
          {reasons.map((reason) => (
            <MenuItem key={reason} disabled>
              Left out: {reason}
            </MenuItem>
          ))}
          {mayDecide && (
            <MenuItem onClick={() => openQuery({ ...place, row: at.rows[0]! })}>Ask about this row</MenuItem>
          )}
          <MenuItem onClick={() => openPanel('mapping')}>Heading, units and data rows …</MenuItem>
        </MenuList>
      </MenuPopover>
    </Menu>
  );
}
