import { readChoice, readNumber, refuseUnused } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import { BERGER_1978_LIMIT_KA, bergerOrbit } from './elements';

export interface OrbitRequest {
  ageKaBp: number;
  solution?: 'berger1978';
}

export interface OrbitAnswer {
  eccentricity: number;
  obliquityDeg: number;
  perihelionLongitudeDeg: number;
  climaticPrecession: number;
  cautions: Caution[];
  method: { name: string; source: string };
}

export const AGE_FIELD = {
  field: 'ageKaBp',
  unit: 'ka BP',
  min: -BERGER_1978_LIMIT_KA,
  max: BERGER_1978_LIMIT_KA,
} as const;

/** Orbital elements of an age. @throws DomainError when the age or the name of the solution is not served */
export function calculateOrbit(request: OrbitRequest): OrbitAnswer {
  refuseUnused(request, ['ageKaBp', 'solution']);
  readChoice(request, 'solution', ['berger1978'] as const, 'berger1978');
  const { orbit, climaticPrecession, cautions } = bergerOrbit(readNumber(request, AGE_FIELD));
  return {
    ...orbit,
    climaticPrecession,
    cautions,
    method: { name: 'Berger 1978', source: 'Berger (1978), J. Atmos. Sci. 35, 2362–2367' },
  };
}
