import type { RuleEntry } from './queries';

const stages: readonly [stage: string, title: string, when: string][] = [
  ['file', 'The file', 'when it is read'],
  ['submission', 'The submission', 'with each change'],
  ['holdings', 'Against Holdings', 'beside what is held already'],
  ['field', 'Fields', 'when a time-slice field is built'],
  ['grid', 'Grids', 'when a gridded field is made'],
  ['export', 'Exports', 'before a file is handed out'],
];

export type RuleStage = { stage: string; title: string; when: string; entries: RuleEntry[]; notRun: number };

/** Rules by the stage at which they run; a stage without any is left away. */
export const groupRules = (rules: readonly RuleEntry[]): RuleStage[] =>
  stages.flatMap(([stage, title, when]) => {
    const entries = rules.filter((rule) => rule.stage === stage);
    const notRun = entries.filter((rule) => rule.notRun !== null).length;
    return entries.length > 0 ? [{ stage, title, when, entries, notRun }] : [];
  });

export const ruleHolds = ({ id, title, why }: RuleEntry, text: string) =>
  `${id} ${title} ${why}`.toLowerCase().includes(text.trim().toLowerCase());
