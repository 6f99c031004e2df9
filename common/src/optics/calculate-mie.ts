import { readNumber, refuseUnused } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import {
  MAX_SIZE_PARAMETER,
  mie,
  MIN_SIZE_PARAMETER,
  type MieEfficiencies,
  type RefractiveIndex,
} from './mie';
import { readIndex } from './read-index';

export interface MieRequest {
  /** 2πr/λ, λ in the medium round the sphere */
  sizeParameter: number;
  refractiveIndex: RefractiveIndex;
}

export interface MieAnswer extends MieEfficiencies {
  singleScatteringAlbedo: number;
  cautions: Caution[];
  method: { name: string; source: string };
}

export const MIE_METHOD = {
  name: 'Mie series for a homogeneous sphere, m = n − ik',
  source:
    'Mie (1908), Ann. Phys. 330, 377–445; terms after Wiscombe (1980), Appl. Opt. 19, 1505–1509 (from memory)',
};

/** Efficiencies of one sphere. @throws DomainError naming field, value and range */
export function calculateMie(request: MieRequest): MieAnswer {
  refuseUnused(request, ['sizeParameter', 'refractiveIndex']);
  const sizeParameter = readNumber(request, {
    field: 'sizeParameter',
    unit: '',
    min: MIN_SIZE_PARAMETER,
    max: MAX_SIZE_PARAMETER,
  });
  const sphere = mie(sizeParameter, readIndex(request));
  const empty = sphere.qExt === 0;
  return {
    ...sphere,
    singleScatteringAlbedo: empty ? 1 : sphere.qSca / sphere.qExt,
    cautions: empty
      ? [
          {
            code: 'nothing-scatters',
            message:
              'A sphere with the index of its medium takes nothing from the light; albedo 1 and asymmetry 0 stand for “none”.',
          },
        ]
      : [],
    method: MIE_METHOD,
  };
}
