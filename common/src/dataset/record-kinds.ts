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

const BY_ID = new Map([...DATASET_KINDS, ...RECORD_KINDS].map((kind) => [kind.id, kind]));

/** @throws DomainError `unknown-dataset-kind` for what is neither a kind of samples nor of records */
export function readableKind(id: string): DatasetKind {
  const kind = BY_ID.get(id);
  if (kind) return kind;
  throw new DomainError('unknown-dataset-kind', { field: 'kind', value: id, allowed: [...BY_ID.keys()] });
}
