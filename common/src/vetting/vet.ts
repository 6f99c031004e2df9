import type { SampleRow } from '../dataset/sample-row';
import type { VettingContext } from './context';
import { presentText } from './cell-problems';
import type { Finding, Rule, RuleHit, Stage } from './rule';
import { rules as allRules } from './rules/index';
import { isWithoutValue } from './samples';

export interface VetOptions {
  /** which stages to run; what a file, its form and Holdings can answer when absent */
  stages?: readonly Stage[];
  rules?: readonly Rule[];
}

export interface VetCounts {
  /** rows of the file, left-out ones included */
  rows: number;
  leftOut: number;
  /** kept rows without a value: they stay visible and never enter a version */
  withoutValue: number;
  errors: number;
  warnings: number;
  notes: number;
  byRule: Record<string, number>;
}

const INTAKE: readonly Stage[] = ['file', 'submission', 'holdings'];
/** Kinds a rule looks at that names none: those whose rows are samples. */
const SAMPLE_KINDS: readonly string[] = ['dust-flux', 'point-optical-depth'];

/**
 * Runs every rule of the wanted stages that can run and answers its findings in reading order:
 * file first, then sheet by sheet in the order of the workbook, row, column, rule.
 *
 * Rows left out by a person settle their findings: no rule sees them.
 * Pure and deterministic: the same context gives the same findings with the same keys.
 * Odd data never throws: should a rule break, that is said as a warning under the rule's own id.
 */
export function vet(context: VettingContext, options: VetOptions = {}): Finding[] {
  const stages = options.stages ?? INTAKE;
  const kept = { ...context, rows: context.rows.filter((row) => row.leftOut === undefined) };
  const kind = context.kind ?? 'dust-flux';
  const wanted = (options.rules ?? allRules).filter(
    (rule) => !rule.notRun && stages.includes(rule.stage) && looksAt(rule, kind),
  );
  const placed = placements(kept, wanted);
  placed.sort(
    (a, b) => a.sheet - b.sheet || a.row - b.row || a.column - b.column || a.rule - b.rule || a.nth - b.nth,
  );
  const keyOf = keyMaker(kept.rows);
  return placed.map(({ hit, rule: index }) => withRule(wanted[index]!, hit, keyOf));
}

const looksAt = ({ kinds = SAMPLE_KINDS }: Rule, kind: string): boolean =>
  kinds === 'all' || kinds.includes(kind);

function withRule(rule: Rule, hit: RuleHit, keyOf: (rule: Rule, hit: RuleHit) => string): Finding {
  return {
    ...hit,
    severity: hit.severity ?? rule.severity,
    code: rule.id,
    slug: rule.slug,
    title: rule.title,
    key: keyOf(rule, hit),
  };
}

/** What the findings and rows add up to. */
export function counts(context: VettingContext, findings: readonly Finding[]): VetCounts {
  const byRule: Record<string, number> = {};
  for (const { code } of findings) byRule[code] = (byRule[code] ?? 0) + 1;
  const kept = context.rows.filter((row) => row.leftOut === undefined);
  const ofSeverity = (severity: Finding['severity']) =>
    findings.filter((f) => f.severity === severity).length;
  return {
    rows: context.rows.length,
    leftOut: context.rows.length - kept.length,
    withoutValue: kept.filter((row) => isWithoutValue(context, row)).length,
    errors: ofSeverity('error'),
    warnings: ofSeverity('warning'),
    notes: ofSeverity('note'),
    byRule,
  };
}

function collect(rule: Rule, context: VettingContext): RuleHit[] {
  const hits: RuleHit[] = [];
  try {
    for (const hit of rule.check(context)) hits.push(hit);
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    hits.push({
      severity: 'warning',
      sheet: null,
      row: null,
      column: null,
      subject: 'rule-broke',
      message: `The check "${rule.title}" could not be finished on this file: ${reason}`,
      remedy: 'Check this point by hand, waive the warning with what was found, and report the file.',
      remedyKind: 'waive',
    });
  }
  return hits;
}

/** A hit with its place in reading order as numbers, worked out once: sorting 100,000 hits compares them often. */
interface Placed {
  hit: RuleHit;
  sheet: number;
  row: number;
  column: number;
  rule: number;
  nth: number;
}

function placements(context: VettingContext, wanted: readonly Rule[]): Placed[] {
  const sheets = new Map(context.workbook.sheets.map((sheet, index) => [sheet.name, index]));
  const placed: Placed[] = [];
  for (const [rule, one] of wanted.entries()) {
    for (const hit of collect(one, context)) {
      if (hit.sheet !== null && !sheets.has(hit.sheet)) sheets.set(hit.sheet, sheets.size);
      const sheet = hit.sheet === null ? -1 : sheets.get(hit.sheet)!;
      placed.push({
        hit,
        sheet,
        row: hit.row ?? 0,
        column: columnNumber(hit.column),
        rule,
        nth: placed.length,
      });
    }
  }
  return placed;
}

/** "A" → 1, "AA" → 27; no column → 0. */
function columnNumber(column: string | null): number {
  let number = 0;
  for (const letter of column ?? '') number = number * 26 + letter.charCodeAt(0) - 64;
  return number;
}

/**
 * Keys say rule, place and present text, so that a waiver ends when the cell is changed.
 * Equal keys are told apart by a running number, in reading order.
 */
function keyMaker(rows: readonly SampleRow[]): (rule: Rule, hit: RuleHit) => string {
  const texts = cellTexts(rows);
  const used = new Map<string, number>();
  return (rule, hit) => {
    const text =
      hit.row === null || hit.field === undefined ? '' : texts(hit.sheet ?? '', hit.row, hit.field);
    const parts = [
      rule.id,
      hit.sheet ?? '',
      hit.row ?? '',
      hit.column ?? '',
      hit.field ?? '',
      hit.subject ?? '',
      mark(text),
    ];
    const key = parts.join('|');
    const times = (used.get(key) ?? 0) + 1;
    used.set(key, times);
    return times === 1 ? key : `${key}|${times}`;
  };
}

/** Short texts as they are, long ones by length and FNV-1a hash: keys are stored and sent. */
function mark(text: string): string {
  if (text.length <= 40) return text;
  let hash = 0x811c9dc5;
  for (let i = 0; i < text.length; i += 1) hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193) >>> 0;
  return `${text.length}#${hash.toString(16)}`;
}

/** Present text of a row's cell by field; '' where a finding is pinned to a cell outside the rows. */
function cellTexts(rows: readonly SampleRow[]): (sheet: string, row: number, field: string) => string {
  const bySheet = new Map<string, Map<number, SampleRow>>();
  for (const sample of rows) {
    const sheet = bySheet.get(sample.sheet) ?? new Map<number, SampleRow>();
    if (!sheet.has(sample.row)) sheet.set(sample.row, sample);
    bySheet.set(sample.sheet, sheet);
  }
  return (sheet, row, field) => {
    const traced = bySheet.get(sheet)?.get(row)?.cells[field];
    return traced ? presentText(traced) : '';
  };
}
