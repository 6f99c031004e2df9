import type { JobSummary } from '@siltlight/common/wire/jobs';
import { Column, DataType } from 'sequelize-typescript';
import { JsonColumn, Row, StoredIn } from '../../database/row';

@StoredIn('jobs')
export class JobRow extends Row {
  @Column(DataType.TEXT)
  declare kind: string;

  @Column(DataType.TEXT)
  declare title: string;

  @Column(DataType.TEXT)
  declare personId: string;

  @Column(DataType.TEXT)
  declare dedupeKey: string | null;

  @JsonColumn
  declare payload: unknown;

  @Column(DataType.TEXT)
  declare state: JobSummary['state'];

  @Column({ type: DataType.REAL, defaultValue: 0 })
  declare progress: number;

  @Column(DataType.TEXT)
  declare stage: string | null;

  @Column({ type: DataType.INTEGER, defaultValue: 0 })
  declare attempts: number;

  @Column(DataType.TEXT)
  declare error: string | null;

  @JsonColumn
  declare result: unknown;

  @Column(DataType.TEXT)
  declare startedAt: string | null;

  @Column(DataType.TEXT)
  declare finishedAt: string | null;
}

export function summaryOf(row: JobRow): JobSummary {
  const resultPath = (row.result as { resultPath?: unknown } | null)?.resultPath;
  return {
    id: row.id,
    kind: row.kind,
    title: row.title,
    state: row.state,
    progress: row.progress,
    stage: row.stage ?? null,
    error: row.error ?? null,
    resultPath: typeof resultPath === 'string' ? resultPath : null,
    createdAt: row.createdAt,
    finishedAt: row.finishedAt ?? null,
  };
}
