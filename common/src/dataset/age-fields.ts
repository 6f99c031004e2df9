import { dustFlux } from './dust-flux';
import type { FieldDeclaration } from './field';

const AGE_FIELDS = [
  'ageKaBp',
  'ageYoungKaBp',
  'ageOldKaBp',
  'ageSigmaKa',
  'depthM',
  'depthTopM',
  'depthBaseM',
];

/** Age and depth as samples of dust have them: records by age share their headings, units and ranges. */
export function ageFields(changes: Record<string, Partial<FieldDeclaration>> = {}): FieldDeclaration[] {
  return dustFlux.fields
    .filter(({ field }) => AGE_FIELDS.includes(field))
    .map((declared) => ({ ...declared, ...changes[declared.field] }));
}
