import type {
  MeasuredRow,
  OpticalSetDetail,
  OpticalSetDraft,
  SpeciesName,
} from '@siltlight/common/wire/optics';
import { emptyRow, measuredFormOf, readMeasured, type MeasuredForm } from './measured-form';
import { definitionIn, rowsOf } from './shown-set';
import { formOf, readSpecies, startingDefinition, type Faults, type SpeciesForm } from './species-form';
import type { ParticleDefinition } from '@siltlight/common/optics/species-optics';

/** What a person tells about a set besides its particles or values. */
export const toldNames = ['sizeCutoff', 'source', 'evidence', 'note'] as const;
export type ToldName = (typeof toldNames)[number];

export type SetForm = {
  title: string;
  species: SpeciesName;
  kind: 'particles' | 'measured';
  particles: SpeciesForm;
  measured: MeasuredForm;
} & Record<ToldName, string>;

export const emptySetForm: SetForm = {
  title: '',
  species: 'dust',
  kind: 'particles',
  particles: formOf(startingDefinition),
  measured: [{ ...emptyRow(0), values: ['0.55', ...emptyRow(0).values.slice(1)] }],
  sizeCutoff: '',
  source: '',
  evidence: '',
  note: '',
};

export function setFormOf(set: OpticalSetDetail): SetForm {
  const definition = definitionIn(set);
  return {
    ...emptySetForm,
    title: set.title,
    species: set.species,
    kind: definition ? 'particles' : 'measured',
    particles: definition ? formOf(definition) : emptySetForm.particles,
    measured: definition ? emptySetForm.measured : measuredFormOf(rowsOf(set)),
    sizeCutoff: set.sizeCutoff,
    source: set.source,
    evidence: set.evidence,
    note: set.note,
  };
}

export type ReadSet = {
  definition: ParticleDefinition | null;
  rows: MeasuredRow[];
  faults: Faults;
  /** null while something is missing or wrong */
  draft: OpticalSetDraft | null;
};

/** Everything the page needs of its form: what to draw, what to send, what is wrong. */
export function readSet(form: SetForm): ReadSet {
  const told = {
    species: form.species,
    sizeCutoff: form.sizeCutoff.trim(),
    source: form.source.trim(),
    evidence: form.evidence.trim(),
    note: form.note.trim(),
  };
  if (form.kind === 'particles') {
    const read = readSpecies(form.particles);
    if ('faults' in read) return { definition: null, rows: [], faults: read.faults, draft: null };
    const { definition } = read;
    return {
      definition,
      rows: [],
      faults: {},
      draft: { ...told, basis: { kind: 'particles', definition } },
    };
  }
  const read = readMeasured(form.measured);
  if ('faults' in read) return { definition: null, rows: [], faults: read.faults, draft: null };
  return {
    definition: null,
    rows: read.rows,
    faults: {},
    draft: { ...told, basis: { kind: 'measured', rows: read.rows } },
  };
}
