import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Correction, Mapping } from '@siltlight/common/sheet/mapping';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { Person } from '../auth/policy';
import { nowIso } from '../database/row';
import { notFound, problem, type ProblemError } from '../http/problem';
import { ParsedWorkbooks } from '../workers/parsed-workbooks.service';
import type { SubmissionRow } from './models/submission-row';
import { CorrectionRow, LeftOutRow } from './models/working-rows';
import { RememberedMappings } from './remembered-mappings.service';
import { SubmissionChanges } from './submission-changes.service';

export interface Editing {
  id: string;
  ifMatch: string | undefined;
  by: Person;
}

type Place = { sheet: string; row: number };

/** What a contributor does to their own draft. The raw file is never touched. */
@Injectable()
export class Mending {
  constructor(
    @InjectModel(CorrectionRow) private readonly corrections: typeof CorrectionRow,
    @InjectModel(LeftOutRow) private readonly leftOut: typeof LeftOutRow,
    private readonly workbooks: ParsedWorkbooks,
    private readonly remembered: RememberedMappings,
    private readonly changes: SubmissionChanges,
  ) {}

  setMapping(editing: Editing, mapping: Mapping): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'edit' as const,
      verb: 'map-submission',
      summary: () => 'mapping corrected',
      after: mapping,
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      requireFits(mapping, await this.workbooks.load(submission.fileSha256));
      await submission.update({ mapping }, { transaction });
      await this.remembered.remember(mapping, submission.contributorId, transaction);
    });
  }

  setMetadata(editing: Editing, metadata: SubmissionMetadata): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'edit' as const,
      verb: 'describe-submission',
      summary: () => 'form filled in',
      after: metadata,
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      await submission.update({ metadata, title: metadata.title ?? submission.title }, { transaction });
    });
  }

  correct(editing: Editing, corrections: Correction[]): Promise<SubmissionRow> {
    const cells = corrections.length === 1 ? 'one cell' : `${corrections.length} cells`;
    const change = {
      ...editing,
      step: 'edit' as const,
      verb: 'mend-submission',
      summary: () => `${cells} mended`,
      after: corrections,
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      const workbook = await this.workbooks.load(submission.fileSha256);
      const rows = corrections.map((correction, index) => ({
        ...correction,
        submissionId: submission.id,
        personId: editing.by.id,
        rawText: rawText(workbook, correction, index),
      }));
      await this.corrections.bulkCreate(rows, { transaction });
    });
  }

  undo(editing: Editing, correctionId: string): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'edit' as const,
      verb: 'undo-mend',
      summary: () => 'a mend undone',
      after: { correctionId },
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      const [undone] = await this.corrections.update(
        { undoneAt: nowIso() },
        { where: { id: correctionId, submissionId: submission.id, undoneAt: null }, transaction },
      );
      if (undone === 0) throw notFound('Correction', correctionId);
    });
  }

  leaveOut(editing: Editing, rows: Place[], reason: string): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'edit' as const,
      verb: 'leave-out-rows',
      summary: () => `${rows.length} rows left out: ${reason}`,
      after: rows,
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      for (const { sheet, row } of rows) {
        const where = { submissionId: submission.id, sheet, row };
        const [known, created] = await this.leftOut.findOrCreate({
          where,
          defaults: { personId: editing.by.id, reason },
          transaction,
        });
        if (!created) await known.update({ reason, personId: editing.by.id }, { transaction });
      }
    });
  }

  takeBack(editing: Editing, rows: Place[]): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'edit' as const,
      verb: 'take-back-rows',
      summary: () => `${rows.length} rows taken back`,
      after: rows,
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      for (const { sheet, row } of rows) {
        await this.leftOut.destroy({ where: { submissionId: submission.id, sheet, row }, transaction });
      }
    });
  }
}

/** A steward sees a submission, but only its contributor changes it. */
export function requireOwn(submission: SubmissionRow, by: Person): void {
  if (submission.contributorId === by.id) return;
  throw problem(
    403,
    'not-yours',
    'This submission is not yours',
    'Only its contributor changes it. Pin a query to the cell, or return it with a reason.',
  );
}

function requireFits({ tables, columns, constants }: Mapping, workbook: RawWorkbook): void {
  const sheets = new Map(workbook.sheets.map((sheet) => [sheet.name, sheet.rows.length]));
  const errors: ProblemError[] = [
    ...tables.flatMap((table, index): ProblemError[] => {
      const rowCount = sheets.get(table.sheet);
      if (rowCount === undefined) return [unknownSheet(`/tables/${index}/sheet`, table.sheet)];
      if (!table.used || (table.firstRow <= table.lastRow && table.lastRow <= rowCount)) return [];
      const message = `Rows ${table.firstRow} to ${table.lastRow} do not lie within the ${rowCount} rows of "${table.sheet}" in order.`;
      return [
        {
          pointer: `/tables/${index}`,
          field: 'lastRow',
          value: table.lastRow,
          allowed: [table.firstRow, rowCount],
          message,
        },
      ];
    }),
    ...columns.flatMap(({ sheet }, index) =>
      sheets.has(sheet) ? [] : [unknownSheet(`/columns/${index}/sheet`, sheet)],
    ),
    ...constants.flatMap(({ sheet }, index) =>
      sheets.has(sheet) ? [] : [unknownSheet(`/constants/${index}/sheet`, sheet)],
    ),
  ];
  if (errors.length > 0)
    throw problem(
      422,
      'mapping-does-not-fit',
      'The mapping does not fit the file',
      errors[0]!.message,
      errors,
    );
}

const unknownSheet = (pointer: string, sheet: string) => ({
  pointer,
  field: 'sheet',
  value: sheet,
  message: `The file has no sheet "${sheet}".`,
});

function rawText(workbook: RawWorkbook, { sheet, row, column }: Correction, index: number): string {
  const found = workbook.sheets.find(({ name }) => name === sheet);
  if (!found || row > found.rows.length) {
    const message = `"${sheet}" has no row ${row}.`;
    throw problem(422, 'no-such-cell', 'There is no such cell', message, [
      { pointer: `/corrections/${index}`, field: 'row', value: row, message },
    ]);
  }
  const at = [...column].reduce((number, letter) => number * 26 + letter.charCodeAt(0) - 64, 0) - 1;
  return found.rows[row - 1]?.[at]?.text ?? '';
}
