import { describe, expect, test } from 'vitest';
import type { VettingContext } from '../context';
import type { Rule, RuleHit } from '../rule';
import { vet } from '../vet';

interface Examples {
  /** title → a context in which the rule has nothing to say */
  quiet: Record<string, VettingContext>;
  /** title → a context in which it fires, and what its one hit (or the first of several) looks like */
  fires: Record<string, { context: VettingContext; hits?: number; first: Partial<RuleHit> }>;
}

/** Shows a rule at rest and at work. Both kinds of example are wanted, and every hit must help its reader. */
export function examplesOf(rule: Rule, { quiet, fires }: Examples): void {
  describe(`${rule.id} ${rule.title}`, () => {
    test('is shown by at least one example of each kind', () => {
      expect(Object.keys(quiet).length).toBeGreaterThan(0);
      expect(Object.keys(fires).length).toBeGreaterThan(0);
    });
    for (const [title, context] of Object.entries(quiet)) {
      test(`says nothing when ${title}`, () => {
        expect([...rule.check(context)]).toEqual([]);
      });
    }
    for (const [title, { context, hits = 1, first }] of Object.entries(fires)) {
      test(`speaks up when ${title}`, () => {
        const found = vet(context, { rules: [rule], stages: [rule.stage] });
        expect(found).toHaveLength(hits);
        expect(found[0]).toMatchObject({ code: rule.id, ...first });
        for (const one of found) {
          expect(one.message).toMatch(/^[^a-z].{15,}\.$/s);
          expect(one.remedy).toMatch(/^[A-Z].{8,}\.$/s);
          expect(one.message + one.remedy).not.toMatch(/undefined|\[object/);
        }
      });
    }
  });
}
