import type { DatasetKind } from '../dataset/field';
import { isRecordKind } from '../dataset/record-kinds';
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
  const names = [...new Set(columns.map((one) => one.reader.field.field))];
  // In a matrix of cloud or temperature the field that stands more than once is the value.
  const repeated = isRecordKind(kind) ? names.find((field) => of(field).length > 1) : undefined;
  const valueField = names.includes(kind.valueField) ? kind.valueField : (repeated ?? kind.valueField);
  const values = of(valueField);
  const fields = names.filter((field) => field !== valueField);
  if (values.length === 0)
    return [
      {
        quantity: kind.id === 'dust-flux' ? 'dust' : kind.id === 'age-series' ? 'event' : kind.valueField,
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
      quantity: quantityOfColumn(value.proposal, kind),
      columns: [value, ...others],
    };
  });
}

function quantityOfColumn(proposal: ColumnProposal, kind: DatasetKind): string {
  if (kind.id === 'dust-flux') return quantityOf(proposal);
  const isNamed = kind.fields.some(
    ({ field, quantity }) => field === kind.valueField && quantity === 'asGiven',
  );
  return isNamed ? (proposal.quantity ?? proposal.heading) : kind.valueField;
}

const quantityOf = (proposal: ColumnProposal): string =>
  proposal.quantity ?? fluxQuantityOf(proposal.heading) ?? 'dust';
