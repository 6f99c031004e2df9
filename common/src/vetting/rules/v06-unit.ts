import { convertTo } from '../../units/convert';
import { isUnitProblem } from '../../units/unit';
import { problemKind } from '../cell-problems';
import { columnPlace } from '../place';
import type { Rule } from '../rule';
import { counted } from '../wording';

/** Fields that mean nothing without a unit of mass, area and time. */
const UNIT_WANTED = new Set(['fluxGM2Yr', 'fluxSigmaGM2Yr']);

/** A unit that is unknown, absent, or does not convert to the field's own. One error a column, however many cells. */
export const unit: Rule = {
  id: 'V06',
  slug: 'unit',
  title: 'Unit is unknown or does not convert',
  severity: 'error',
  stage: 'file',
  needs: [],
  source: 'common practice, no source',
  why: 'Fluxes come in g cm-2 kyr-1, mg m-2 yr-1, kg m-2 s-1 and more, a factor of ten to a million apart; a unit that is guessed is a number that is wrong.',
  kinds: 'all',

  *check(context) {
    const columns = new Map<string, { sheet: string; field: string; why: string; count: number }>();
    for (const row of context.rows) {
      for (const [field, traced] of Object.entries(row.cells)) {
        if (problemKind(traced) !== 'unit') continue;
        const key = `${row.sheet}\u0000${field}`;
        const known = columns.get(key);
        if (known) known.count += 1;
        else columns.set(key, { sheet: row.sheet, field, why: traced.problem!.message, count: 1 });
      }
    }
    for (const { sheet, field, why, count } of columns.values()) {
      yield {
        ...columnPlace(context, sheet, field),
        message: `The unit of ${field} cannot be converted, so ${counted(count, 'value')} could not be used: ${why.replace(/\.$/, '')}.`,
        remedy: 'Type the right unit of the column in the mapping, e.g. mg m-2 yr-1.',
        remedyKind: 'answer',
      };
    }
    for (const column of context.mapping.columns) {
      const { sheet, field } = column;
      if (field === null || !UNIT_WANTED.has(field)) continue;
      const isUsed = context.mapping.tables.some((table) => table.sheet === sheet && table.used);
      if (!isUsed || columns.has(`${sheet}\u0000${field}`)) continue;
      const unitText = column.unit?.trim() ?? '';
      const conversion = unitText === '' ? null : convertTo('massFlux', unitText);
      if (conversion !== null && !isUnitProblem(conversion)) continue;
      const why =
        conversion === null
          ? 'has no unit'
          : `has a unit that does not convert: ${conversion.message.replace(/\.$/, '')}`;
      yield {
        ...columnPlace(context, sheet, field),
        column: column.column,
        message: `Column ${column.column} ("${column.heading}") is mapped to ${field} and ${why}.`,
        remedy: 'Type the unit of the column in the mapping, e.g. mg m-2 yr-1.',
        remedyKind: 'answer',
      };
    }
  },
};
