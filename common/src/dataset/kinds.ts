import { DomainError } from '../physical/domain-error';
import { dustFlux } from './dust-flux';
import type { DatasetKind } from './field';
import { pointOpticalDepth } from './point-optical-depth';

/** Every kind of dataset that can be submitted; a new kind is a new declaration in this list. */
export const DATASET_KINDS: readonly DatasetKind[] = [dustFlux, pointOpticalDepth];

/** @throws DomainError `unknown-dataset-kind` */
export function datasetKind(id: string): DatasetKind {
  const kind = DATASET_KINDS.find((declared) => declared.id === id);
  if (!kind) {
    throw new DomainError('unknown-dataset-kind', {
      field: 'kind',
      value: id,
      allowed: DATASET_KINDS.map((declared) => declared.id),
    });
  }
  return kind;
}
