import type { VettingContext } from './context';

export type Severity = 'error' | 'warning' | 'note';
export type Stage = 'file' | 'submission' | 'holdings' | 'field' | 'grid' | 'export';
/** What a person can do about it: type over the cell, fill in the form, leave rows out with a reason, waive (warnings only). */
export type RemedyKind = 'mend' | 'answer' | 'leave-out' | 'waive' | 'none';

/** One fault or remark, pinned to a cell, a row, a column or the file (what is null is the whole of it). */
export interface RuleHit {
  severity?: Severity;
  sheet: string | null;
  row: number | null;
  /** column letter */
  column: string | null;
  /** field of the dataset kind or of the metadata form */
  field?: string;
  /** names the value and what is expected */
  message: string;
  remedy: string;
  remedyKind: RemedyKind;
  /** a text that would mend the cell, to be offered */
  proposal?: string;
  /** tells hits in the same place apart in their key, when the field alone does not: a site, a code */
  subject?: string;
}

export interface Finding extends Required<Pick<RuleHit, 'severity'>>, Omit<RuleHit, 'severity'> {
  /** rule id, V01 … */
  code: string;
  /** its short name */
  slug: string;
  title: string;
  /** stable over re-runs: code, place and value; waivers and answers hang on it */
  key: string;
}

/** One check of field practice. A rule is one file, one test, one entry of the documentation. */
export interface Rule {
  id: string;
  slug: string;
  title: string;
  severity: Severity;
  stage: Stage;
  /** fields or metadata without which the rule has nothing to say */
  needs: string[];
  /** published source, or "common practice, no source" */
  source: string;
  /** why the check exists, for the page behind "why" */
  why: string;
  /** default limits a steward may change */
  limits?: Record<string, number>;
  /** kinds of dataset it looks at; the kinds of samples (dust flux, point optical depth) when absent */
  kinds?: readonly string[] | 'all';
  /** a rule that cannot run here says why; it is listed as not run and never pretends */
  notRun?: string;
  check(context: VettingContext): Iterable<RuleHit>;
}
