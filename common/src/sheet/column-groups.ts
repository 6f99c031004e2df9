import type { DatasetKind } from '../dataset/field';
import { fluxQuantityOf } from '../dataset/flux-quantity';
import type { MappedColumn } from './mapped-columns';
import type { ColumnProposal } from './mapping';

/** The columns of one sample: a value column and, of each other field, the column that belongs to it. */
export interface ColumnGroup {
  quantity: string;
  columns: MappedColumn[];
}

/**
 * Splits the mapped columns of a table into samples: one for each value column. A field mapped more than once gives
 * each value the nearest column on its left; an uncertainty belongs to the value on its own left.
 */
export function columnGroups(columns: MappedColumn[], kind: DatasetKind): ColumnGroup[] {
  const of = (field: string): MappedColumn[] => columns.filter((one) => one.reader.field.field === field);
  const values = of(kind.valueField);
  const fields = [...new Set(columns.map((one) => one.reader.field.field))].filter(
    (field) => field !== kind.valueField,
  );
  if (values.length === 0)
    return [
      {
        quantity: kind.id === 'dust-flux' ? 'dust' : kind.valueField,
        columns: fields.flatMap((field) => of(field).slice(0, 1)),
      },
    ];
  return values.map((value, i) => {
    const next = values[i + 1]?.index ?? Infinity;
    const others = fields.flatMap((field) => {
      const offered = of(field);
      if (field !== kind.sigmaField)
        return offered
          .filter((one) => one.index < value.index)
          .slice(-1)
          .concat(offered)
          .slice(0, 1);
      const right = offered.filter((one) => one.index > value.index && one.index < next);
      return (values.length === 1 ? right.concat(offered) : right).slice(0, 1);
    });
    return {
      quantity: kind.id === 'dust-flux' ? quantityOf(value.proposal) : kind.valueField,
      columns: [value, ...others],
    };
  });
}

const quantityOf = (proposal: ColumnProposal): string =>
  proposal.quantity ?? fluxQuantityOf(proposal.heading) ?? 'dust';
