import { DomainError } from '../physical/domain-error';
import { ageSeries } from './age-series';
import { backdropTable } from './backdrop-table';
import type { DatasetKind } from './field';
import { gasRecord } from './gas-record';
import { griddedField } from './gridded-field';
import { DATASET_KINDS } from './kinds';
import { opticalSet } from './optical-set';
import { refractiveIndex } from './refractive-index';

/** Kinds whose rows are no samples of a site: they are read by `normaliseRecords` into rows of their own types. */
export const RECORD_KINDS: readonly DatasetKind[] = [
  griddedField,
  backdropTable,
  refractiveIndex,
  opticalSet,
  gasRecord,
  ageSeries,
];

export const isRecordKind = (kind: DatasetKind): boolean => RECORD_KINDS.includes(kind);

/** @throws DomainError `unknown-dataset-kind` for what is neither a kind of samples nor of records */
export function readableKind(id: string): DatasetKind {
  const kinds = [...DATASET_KINDS, ...RECORD_KINDS];
  const kind = kinds.find((declared) => declared.id === id);
  if (kind) return kind;
  const allowed = kinds.map((declared) => declared.id);
  throw new DomainError('unknown-dataset-kind', { field: 'kind', value: id, allowed });
}
