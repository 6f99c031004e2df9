import type { SampleRow } from '../dataset/sample-row';
import type { RawWorkbook } from '../sheet/grid';
import type { Mapping } from '../sheet/mapping';
import type { Archive } from './archive';
import type { StewardLimits } from './limits';

/** Answers of the metadata form. Every key optional: what is missing is what rules ask for. */
export interface SubmissionMetadata {
  title?: string;
  creators?: { name: string; orcid?: string; affiliation?: string }[];
  licence?: string;
  publicationDoi?: string;
  publicationCitation?: string;
  archive?: Archive;
  method?: string;
  sizeCutoff?: string;
  dustDefinition?: string;
  ageDatum?: string;
  ageModel?: string;
  uncertaintyMeaning?: string;
  densityBasis?: string;
  note?: string;
}

/** A site already in Holdings, for checks against what is known. */
export interface HeldSite {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  datasetTitle: string;
  archive: string | null;
  /** median of its dust fluxes [g m⁻² yr⁻¹], for the comparison with neighbours; absent: not compared */
  medianFluxGM2Yr?: number | null;
}

/** A value that Holdings have already, for the search for values given twice. */
export interface HeldSample {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  datasetTitle: string;
  /** dust, nssCa, Fe … */
  quantity: string;
  sizeCutoff: string | null;
  ageKaBp: number;
  fluxGM2Yr: number;
}

/** Everything a rule may look at. Rules are pure: the same context gives the same findings in the same order. */
export interface VettingContext {
  workbook: RawWorkbook;
  mapping: Mapping;
  rows: SampleRow[];
  metadata: SubmissionMetadata;
  /** false for a file checked without a form: questions the form would ask are not held against the file */
  formOffered: boolean;
  heldSites: HeldSite[];
  /** values of published datasets near the file's sites or under their names; absent: V56 and V57 look within the file */
  heldSamples?: readonly HeldSample[];
  /** what stewards changed of the rules' limits, by rule id; empty: the defaults hold */
  limits: StewardLimits;
  /** raw text that was resolved to "missing" or below detection, by code */
  missingCodes: Record<string, number>;
  /** dataset kind; `dust-flux` when absent */
  kind?: string;
  /** rows of the upload this one replaces, for the list of differences */
  earlierRows?: SampleRow[];
}
