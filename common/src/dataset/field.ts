import type { UnitKind } from '../units/convert';

/** What a field holds: a kind of quantity with a unit, or one of those that have a reader of their own. */
export type FieldQuantity =
  | UnitKind
  | 'age'
  | 'latitude'
  | 'longitude'
  | 'month'
  | 'count'
  | 'text'
  /** a number that keeps the unit its column gives: what it is of is told by its heading */
  | 'asGiven';

/** One field of a dataset kind: the single place that proposal, conversion, checks, forms, templates and exports read. */
export interface FieldDeclaration {
  /** property of SampleRow, or key of its `cells` where SampleRow has none */
  field: string;
  /** for people, with no unit */
  title: string;
  quantity: FieldQuantity;
  /** '' for text and counts */
  canonicalUnit: string;
  /** true: a row without it cannot be used (it may come from a column, from above the table, or from the form) */
  required: boolean;
  /** how contributors head such a column: lower case, no unit, no accents; English, German, French, Spanish and others */
  headings: string[];
  /** closed range of possible values in the canonical unit; outside is an error, not merely unusual */
  min?: number;
  max?: number;
  help: string;
}

export interface DatasetKind {
  id: string;
  title: string;
  /** the field whose values the dataset is about */
  valueField: string;
  /** one standard error of the value field */
  sigmaField: string;
  fields: FieldDeclaration[];
  /** uncertainty fields of values other than `valueField`, by the field they belong to */
  sigmas?: Record<string, string>;
  /** sets of fields that make a table worth reading though it has no column of `valueField` */
  usableWith?: string[][];
}

/** @returns the declaration, or undefined when the kind has no such field */
export function fieldOf(kind: DatasetKind, field: string): FieldDeclaration | undefined {
  return kind.fields.find((declared) => declared.field === field);
}
