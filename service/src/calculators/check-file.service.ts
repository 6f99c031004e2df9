import { Injectable } from '@nestjs/common';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { SampleRow } from '@siltlight/common/dataset/sample-row';
import type { Mapping } from '@siltlight/common/sheet/mapping';
import { proposeWorkbook } from '@siltlight/common/sheet/propose';
import type { DatasetKindId } from '@siltlight/common/wire/submissions';
import { Evaluations } from '../submissions/evaluation.service';
import { requireFits } from '../submissions/mapping-fits';
import { readUpload } from '../workers/upload-reader';

/** Held to less than a submission: nothing is kept that would justify more. */
export const CHECK_FILE_BYTES = 50 * 1024 * 1024;

/** A script waits for the answer: it comes within half a minute, whatever the file. */
const CHECK_LIMITS = {
  workbookBytes: CHECK_FILE_BYTES,
  textBytes: CHECK_FILE_BYTES,
  cpuSeconds: 20,
  wallSeconds: 24,
  textWallSeconds: 24,
};

export interface CheckRequest {
  kind: DatasetKindId;
  mapping?: Partial<Mapping> | undefined;
  offset: number;
  limit: number;
}

/** Reads, proposes, normalises and vets as Intake does, and keeps nothing. */
@Injectable()
export class CheckFile {
  constructor(private readonly evaluations: Evaluations) {}

  async check(file: { path: string; fileName: string }, request: CheckRequest) {
    const workbook = await readUpload({ ...file, limits: CHECK_LIMITS });
    const proposal = proposeWorkbook(workbook, datasetKind(request.kind));
    const mapping: Mapping = { ...proposal, ...request.mapping };
    requireFits(mapping, workbook, '/mapping');
    const { rows, findings, counts } = await this.evaluations.evaluate({
      workbook,
      kind: request.kind,
      mapping,
      metadata: {},
      corrections: [],
      leftOut: [],
      waivedKeys: new Set(),
      formOffered: false,
    });
    const { offset, limit } = request;
    return {
      tables: mapping.tables,
      columns: mapping.columns,
      rows: rows.slice(offset, offset + limit).map(rowOf),
      findings: findings.map(({ code, slug, severity, sheet, row, column, message, remedy }) => ({
        code,
        slug,
        severity,
        sheet,
        row,
        column,
        message,
        remedy,
      })),
      counts: { rows: counts.rows, errors: counts.errors, warnings: counts.warnings, notes: counts.notes },
    };
  }
}

function rowOf(row: SampleRow) {
  const { sheet, site, latitudeDeg, longitudeDeg, ageKaBp, fluxGM2Yr, fluxSigmaGM2Yr } = row;
  const { quantity, ageSigmaKa, depthM, sizeCutoff } = row;
  const position = { sheet, row: row.row, site, latitudeDeg, longitudeDeg };
  return { ...position, ageKaBp, fluxGM2Yr, fluxSigmaGM2Yr, quantity, ageSigmaKa, depthM, sizeCutoff };
}
