import type { SampleRow } from '../dataset/sample-row';
import type { RawWorkbook } from '../sheet/grid';
import type { Mapping } from '../sheet/mapping';

/** Answers of the metadata form. Every key optional: what is missing is what rules ask for. */
export interface SubmissionMetadata {
  title?: string;
  creators?: { name: string; orcid?: string; affiliation?: string }[];
  licence?: string;
  publicationDoi?: string;
  publicationCitation?: string;
  archive?: 'ice' | 'marine' | 'loess' | 'lake' | 'peat' | 'other';
  method?: string;
  sizeCutoff?: string;
  dustDefinition?: string;
  ageDatum?: string;
  ageModel?: string;
  uncertaintyMeaning?: string;
  densityBasis?: string;
  note?: string;
}

/** A row already in Holdings, for checks against what is known. */
export interface HeldSite {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  datasetTitle: string;
  archive: string | null;
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
  /** limits of each rule by id, after the stewards' changes */
  limits: Record<string, Record<string, number>>;
  /** raw text that was resolved to "missing" or below detection, by code */
  missingCodes: Record<string, number>;
  /** dataset kind; `dust-flux` when absent */
  kind?: 'dust-flux' | 'point-optical-depth';
  /** rows of the upload this one replaces, for the list of differences */
  earlierRows?: SampleRow[];
}
