/** Keys of a submission's metadata; vetting declares their values. */
export type MetadataKey =
  | 'title'
  | 'creators'
  | 'licence'
  | 'publicationDoi'
  | 'publicationCitation'
  | 'archive'
  | 'method'
  | 'sizeCutoff'
  | 'dustDefinition'
  | 'ageDatum'
  | 'ageModel'
  | 'uncertaintyMeaning'
  | 'densityBasis'
  | 'note';

export interface MetadataChoice {
  value: string;
  label: string;
}

/** One question of the metadata form; drives the form, its check and the catalogue entry. */
export interface MetadataField {
  field: MetadataKey;
  label: string;
  input: 'text' | 'long-text' | 'choice' | 'people' | 'licence';
  /** a submission cannot be handed in while this is neither answered here nor by the sheet */
  required: boolean;
  /** field of the dataset kind that answers the question when the sheet has it as a column */
  answeredBySheet?: string;
  choices?: MetadataChoice[];
  help: string;
  pattern?: { regex: string; message: string };
}

/** Licences offered first; any other SPDX identifier may be typed (spdx.org/licenses). */
export const LICENCES: MetadataChoice[] = [
  { value: 'CC-BY-4.0', label: 'Creative Commons Attribution 4.0' },
  { value: 'CC0-1.0', label: 'Creative Commons Zero 1.0' },
  { value: 'CC-BY-SA-4.0', label: 'Creative Commons Attribution Share Alike 4.0' },
  { value: 'CC-BY-NC-4.0', label: 'Creative Commons Attribution Non Commercial 4.0' },
  { value: 'ODC-By-1.0', label: 'Open Data Commons Attribution 1.0' },
  { value: 'ODbL-1.0', label: 'Open Data Commons Open Database 1.0' },
];

export const ARCHIVES: MetadataChoice[] = [
  { value: 'ice', label: 'Ice core' },
  { value: 'marine', label: 'Marine sediment' },
  { value: 'loess', label: 'Loess' },
  { value: 'lake', label: 'Lake sediment' },
  { value: 'peat', label: 'Peat' },
  { value: 'other', label: 'Other' },
];

export const METADATA_FORM: readonly MetadataField[] = [
  { field: 'title', label: 'Title', input: 'text', required: true, help: 'What the data are, where and of which time; it heads the citation.' },
  { field: 'creators', label: 'Creators', input: 'people', required: true, help: 'In the order of the citation; an ORCID iD tells people of one name apart.' },
  { field: 'licence', label: 'Licence', input: 'licence', required: true, choices: LICENCES, help: 'Without a licence nobody may reuse the data; the SPDX identifier is stored.', pattern: { regex: '^[A-Za-z0-9][A-Za-z0-9.+-]*$', message: 'An SPDX identifier such as CC-BY-4.0 is wanted.' } },
  { field: 'publicationDoi', label: 'DOI of the publication', input: 'text', required: false, help: 'Of the paper the numbers come from, such as 10.1038/nature06763.', pattern: { regex: '^10\\.\\d{4,9}/\\S+$', message: 'A DOI begins with 10. and has a slash, such as 10.1038/nature06763.' } },
  { field: 'publicationCitation', label: 'Citation of the publication', input: 'long-text', required: false, help: 'In full, when there is no DOI.' },
  { field: 'archive', label: 'Archive', input: 'choice', required: true, answeredBySheet: 'archive', choices: ARCHIVES, help: 'What was drilled, cored or sampled.' },
  { field: 'method', label: 'Method', input: 'text', required: false, help: 'How the dust was measured: Coulter counter, laser, chemistry, weighing …' },
  { field: 'sizeCutoff', label: 'Size cut-off', input: 'choice', required: true, answeredBySheet: 'sizeCutoff', choices: [
    { value: 'bulk', label: 'Bulk: all sizes' },
    { value: '<10 um', label: 'Below 10 µm diameter' },
    { value: '<20 um', label: 'Below 20 µm diameter' },
    { value: '<5 um', label: 'Below 5 µm diameter' },
    { value: 'other', label: 'Other, said in the note' },
  ], help: 'Diameter, not radius. Fluxes of different cut-offs are never averaged together.' },
  { field: 'dustDefinition', label: 'What counts as dust', input: 'choice', required: true, choices: [
    { value: 'insoluble', label: 'Insoluble particles' },
    { value: 'eolian', label: 'Eolian fraction' },
    { value: 'lithogenic', label: 'Lithogenic or terrigenous fraction' },
    { value: 'non-carbonate', label: 'Non-carbonate residue' },
    { value: 'from-tracer', label: 'From a tracer by a stated factor' },
    { value: 'total', label: 'Total mass' },
  ], help: 'Total mass accumulation is not dust unless the archive is pure dust.' },
  { field: 'ageDatum', label: 'Ages count from', input: 'choice', required: true, choices: [
    { value: 'BP1950', label: 'Before 1950 CE (BP)' },
    { value: 'b2k', label: 'Before 2000 CE (b2k)' },
    { value: 'CE', label: 'Calendar years CE' },
  ], help: 'Fifty years lie between BP and b2k.' },
  { field: 'ageModel', label: 'Age model', input: 'long-text', required: false, help: 'Time scale or tie points, calibration curve, reservoir age, where it is extrapolated.' },
  { field: 'uncertaintyMeaning', label: 'Uncertainties are', input: 'choice', required: false, choices: [
    { value: 'standard-error', label: 'One standard error' },
    { value: 'standard-deviation', label: 'One standard deviation of the samples' },
    { value: 'two-sigma', label: 'Two standard errors' },
    { value: 'range', label: 'Full range' },
  ], help: 'What the numbers in the error column mean.' },
  { field: 'densityBasis', label: 'Densities are', input: 'choice', required: false, choices: [
    { value: 'measured', label: 'Measured' },
    { value: 'modelled', label: 'Modelled' },
    { value: 'assumed', label: 'Assumed' },
  ], help: 'Asked when fluxes rest on a dry bulk density.' },
  { field: 'note', label: 'Note to the steward', input: 'long-text', required: false, help: 'Anything the sheet does not say.' },
]; // prettier-ignore
