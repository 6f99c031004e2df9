import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { ColumnProposal, Mapping } from '@siltlight/common/sheet/mapping';
import type { Transaction } from 'sequelize';
import { RememberedMappingRow } from './models/working-rows';

/** What a contributor once made of headings is proposed again for their next file with the same headings. */
@Injectable()
export class RememberedMappings {
  constructor(@InjectModel(RememberedMappingRow) private readonly rows: typeof RememberedMappingRow) {}

  async applyTo(mapping: Mapping, contributorId: string): Promise<Mapping> {
    const columns: ColumnProposal[] = [];
    for (const sheet of sheetsOf(mapping)) {
      const own = mapping.columns.filter((column) => column.sheet === sheet);
      const known = await this.rows.findOne({ where: { contributorId, pattern: patternOf(own) } });
      columns.push(...(known ? own.map((column, index) => remembered(column, known.columns[index])) : own));
    }
    return { ...mapping, columns };
  }

  async remember(mapping: Mapping, contributorId: string, transaction: Transaction): Promise<void> {
    for (const sheet of sheetsOf(mapping)) {
      const own = mapping.columns.filter((column) => column.sheet === sheet);
      const columns = own.map(({ heading, field, unit }) => ({ heading, field, unit }));
      const where = { contributorId, pattern: patternOf(own) };
      const [row, created] = await this.rows.findOrCreate({ where, defaults: { columns }, transaction });
      if (!created) await row.update({ columns }, { transaction });
    }
  }
}

const sheetsOf = ({ columns }: Mapping): string[] => [...new Set(columns.map(({ sheet }) => sheet))];

const patternOf = (columns: readonly ColumnProposal[]): string =>
  columns.map(({ heading }) => heading.trim().toLowerCase()).join(' | ');

function remembered(
  column: ColumnProposal,
  known: { field: string | null; unit: string | null } | undefined,
): ColumnProposal {
  if (!known || (known.field === column.field && known.unit === column.unit)) return column;
  return {
    ...column,
    field: known.field,
    unit: known.unit,
    confidence: 1,
    reason: 'As you mapped this heading the last time.',
  };
}
