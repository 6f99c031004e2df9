import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { rulesPage, stageCounts } from '../report';
import { rules } from './index';
import { notRunRules } from './not-run';

test('V01 to V80 are registered once each, in order, with a slug of their own', () => {
  const wanted = Array.from({ length: 80 }, (_, i) => `V${String(i + 1).padStart(2, '0')}`);
  expect(rules.map((rule) => rule.id)).toEqual(wanted);
  expect(new Set(rules.map((rule) => rule.slug)).size).toBe(80);
});

test('every rule that runs has its own file, and examples of both kinds that one test file runs', () => {
  const groups = readdirSync(__dirname)
    .filter((name) => name.endsWith('.test.ts'))
    .map((name) => readFileSync(join(__dirname, name), 'utf8'))
    .join('');
  for (const { id, slug } of rules.filter((rule) => !rule.notRun)) {
    const name = `${id.toLowerCase()}-${slug}`;
    expect(existsSync(join(__dirname, `${name}.ts`)), `${name}.ts`).toBe(true);
    const examples = readFileSync(join(__dirname, `${name}.examples.test-support.ts`), 'utf8');
    expect(examples, name).toMatch(/examplesOf\(\w+, \{[\s\S]*quiet: \{[\s\S]*fires: \{/);
    expect(groups.split(`'./${name}.examples.test-support'`), name).toHaveLength(2);
  }
});

test('a rule that does not run says why and never pretends', () => {
  expect(rules.filter((rule) => rule.notRun).map((rule) => rule.id)).toEqual(
    notRunRules.map((rule) => rule.id),
  );
  for (const { notRun } of notRunRules) expect(notRun).toMatch(/^(Not run: |Runs ).{15,}\.$/);
});

test('every rule explains itself: title, why, source, stage', () => {
  for (const page of rulesPage()) {
    expect(page.title.length, page.id).toBeGreaterThan(10);
    expect(page.why, page.id).toMatch(/^[A-Z0-9].{30,}\.$/);
    expect(page.source.length, page.id).toBeGreaterThan(5);
    for (const limit of Object.values(page.limits)) expect(limit, page.id).toEqual(expect.any(Number));
  }
});

test('the counts by stage add up to all rules', () => {
  const sums = Object.values(stageCounts()).map(({ run, notRun }) => run + notRun);
  expect(sums.reduce((a, b) => a + b)).toBe(80);
  expect(stageCounts().field.run).toBe(0);
});
