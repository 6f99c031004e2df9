import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { newId, nowIso } from '../database/row';
import type { Correction, Mapping } from '@siltlight/common/sheet/mapping';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { Transaction } from 'sequelize';
import { notFound } from '../http/problem';
import type { Draft } from './evaluation.service';
import { requireFits } from './mapping-fits';
import type { SubmissionRow } from './models/submission-row';
import { CorrectionRow, LeftOutRow } from './models/working-rows';
import { rawText } from './raw-text';
import { RememberedMappings } from './remembered-mappings.service';
import { requireOwn } from './require-own';
import { type Editing, SubmissionChanges } from './submission-changes.service';

type Place = { sheet: string; row: number };

interface Mend {
  verb: string;
  summary: string;
  after: unknown;
  amend: (draft: Draft) => Draft;
  store: (submission: SubmissionRow, transaction: Transaction) => Promise<unknown>;
}

/** What a contributor does to their own draft. The raw file is never touched. */
@Injectable()
export class Mending {
  constructor(
    @InjectModel(CorrectionRow) private readonly corrections: typeof CorrectionRow,
    @InjectModel(LeftOutRow) private readonly leftOut: typeof LeftOutRow,
    private readonly remembered: RememberedMappings,
    private readonly changes: SubmissionChanges,
  ) {}

  setMapping(editing: Editing, mapping: Mapping): Promise<SubmissionRow> {
    return this.mend(editing, {
      verb: 'map-submission',
      summary: 'mapping corrected',
      after: mapping,
      amend: (draft) => {
        requireFits(mapping, draft.workbook);
        return { ...draft, mapping };
      },
      store: async (submission, transaction) => {
        await submission.update({ mapping }, { transaction });
        await this.remembered.remember(mapping, submission.contributorId, transaction);
      },
    });
  }

  setMetadata(editing: Editing, metadata: SubmissionMetadata): Promise<SubmissionRow> {
    return this.mend(editing, {
      verb: 'describe-submission',
      summary: 'form filled in',
      after: metadata,
      amend: (draft) => ({ ...draft, metadata }),
      store: (submission, transaction) =>
        submission.update({ metadata, title: metadata.title ?? submission.title }, { transaction }),
    });
  }

  correct(editing: Editing, corrections: Correction[]): Promise<SubmissionRow> {
    const made = corrections.map((correction) => ({ ...correction, id: newId(), rawText: '' }));
    return this.mend(editing, {
      verb: 'mend-submission',
      summary: corrections.length === 1 ? 'one cell mended' : `${corrections.length} cells mended`,
      after: corrections,
      amend: (draft) => {
        made.forEach((correction, index) => {
          correction.rawText = rawText(draft.workbook, correction, index);
        });
        return { ...draft, corrections: [...draft.corrections, ...made] };
      },
      store: ({ id: submissionId }, transaction) =>
        this.corrections.bulkCreate(
          made.map((correction) => ({ ...correction, submissionId, personId: editing.by.id })),
          { transaction },
        ),
    });
  }

  undo(editing: Editing, correctionId: string): Promise<SubmissionRow> {
    return this.mend(editing, {
      verb: 'undo-mend',
      summary: 'a mend undone',
      after: { correctionId },
      amend: (draft) => {
        const corrections = draft.corrections.filter(({ id }) => id !== correctionId);
        if (corrections.length === draft.corrections.length) throw notFound('Correction', correctionId);
        return { ...draft, corrections };
      },
      store: (_submission, transaction) =>
        this.corrections.update({ undoneAt: nowIso() }, { where: { id: correctionId }, transaction }),
    });
  }

  leaveOut(editing: Editing, rows: Place[], reason: string): Promise<SubmissionRow> {
    const places = distinct(rows);
    return this.mend(editing, {
      verb: 'leave-out-rows',
      summary: `${places.length} rows left out: ${reason}`,
      after: { rows: places, reason },
      amend: (draft) => {
        places.forEach(({ sheet, row }, index) =>
          rawText(draft.workbook, { sheet, row, column: 'A' }, index, 'rows'),
        );
        return { ...draft, leftOut: [...without(draft.leftOut, places), ...withReason(places, reason)] };
      },
      store: async ({ id: submissionId }, transaction) => {
        await this.putBack(submissionId, places, transaction);
        const made = withReason(places, reason);
        await this.leftOut.bulkCreate(
          made.map((place) => ({ ...place, submissionId, personId: editing.by.id })),
          { transaction },
        );
      },
    });
  }

  takeBack(editing: Editing, rows: Place[]): Promise<SubmissionRow> {
    const places = distinct(rows);
    return this.mend(editing, {
      verb: 'take-back-rows',
      summary: `${places.length} rows taken back`,
      after: { rows: places },
      amend: (draft) => ({ ...draft, leftOut: without(draft.leftOut, places) }),
      store: ({ id }, transaction) => this.putBack(id, places, transaction),
    });
  }

  private async putBack(submissionId: string, places: Place[], transaction: Transaction): Promise<void> {
    const bySheet = groupedBySheet(places);
    for (const [sheet, rows] of bySheet) {
      const where = { submissionId, sheet, row: rows.map(({ row }) => row) };
      await this.leftOut.destroy({ where, transaction });
    }
  }

  private mend(editing: Editing, { verb, summary, after, amend, store }: Mend): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'edit' as const,
      verb,
      summary: () => summary,
      after: () => after,
      amend: (draft: Draft, submission: SubmissionRow) => {
        requireOwn(submission, editing.by);
        return amend(draft);
      },
    };
    return this.changes.run(change, async (submission, transaction) => {
      await store(submission, transaction);
    });
  }
}

const keyOf = ({ sheet, row }: Place): string => `${sheet}\0${row}`;

const distinct = (places: Place[]): Place[] => [
  ...new Map(places.map(({ sheet, row }) => [keyOf({ sheet, row }), { sheet, row }])).values(),
];

function groupedBySheet(places: readonly Place[]): Map<string, Place[]> {
  const groups = new Map<string, Place[]>();
  for (const place of places) groups.set(place.sheet, [...(groups.get(place.sheet) ?? []), place]);
  return groups;
}

const withReason = (places: Place[], reason: string) => places.map((place) => ({ ...place, reason }));

function without<T extends Place>(all: readonly T[], places: readonly Place[]): T[] {
  const keys = new Set(places.map(keyOf));
  return all.filter((place) => !keys.has(keyOf(place)));
}
