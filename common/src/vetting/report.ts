import { rules } from './rules/index';
import type { Severity, Stage } from './rule';

/** One entry of the page behind "why", made from the rules themselves so that it cannot drift from them. */
export interface RulePage {
  id: string;
  slug: string;
  title: string;
  severity: Severity;
  stage: Stage;
  source: string;
  why: string;
  needs: string[];
  limits: Record<string, number>;
  /** why the rule is not run here, null when it is */
  notRun: string | null;
}

/** All rules, in the order of their ids, run or not. */
export function rulesPage(): RulePage[] {
  return rules.map((rule) => ({
    id: rule.id,
    slug: rule.slug,
    title: rule.title,
    severity: rule.severity,
    stage: rule.stage,
    source: rule.source,
    why: rule.why,
    needs: [...rule.needs],
    limits: { ...rule.limits },
    notRun: rule.notRun ?? null,
  }));
}

/** How many rules each stage has, and how many of them run. */
export function stageCounts(): Record<Stage, { run: number; notRun: number }> {
  const stages: Stage[] = ['file', 'submission', 'holdings', 'field', 'grid', 'export'];
  const count = (stage: Stage, run: boolean) =>
    rules.filter((rule) => rule.stage === stage && (rule.notRun === undefined) === run).length;
  return Object.fromEntries(
    stages.map((stage) => [stage, { run: count(stage, true), notRun: count(stage, false) }]),
  ) as Record<Stage, { run: number; notRun: number }>;
}
