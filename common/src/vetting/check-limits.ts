import { ARCHIVES } from '../dataset/metadata-form';
import { DomainError } from '../physical/domain-error';
import type { StewardLimits } from './limits';
import type { Rule } from './rule';

/**
 * Refuses limits that no rule would read, so that a steward never sets a number without effect.
 *
 * @throws DomainError `no-such-rule`, `no-limits`, `no-such-limit`, `no-such-archive`, `not-a-number`;
 *   each names what is allowed
 */
export function requireLimits(limits: StewardLimits, rules: readonly Rule[]): void {
  for (const [id, { all = {}, byArchive = {} }] of Object.entries(limits)) {
    const rule = rules.find((one) => one.id === id);
    if (!rule) refuse('no-such-rule', 'rule', id, 'the id of a rule, V01 to V80');
    if (!rule?.limits) refuse('no-limits', 'rule', id, 'a rule with limits');
    requireKnown(id, all, rule.limits);
    for (const [archive, own] of Object.entries(byArchive)) {
      const archives = ARCHIVES.map(({ value }) => value);
      if (!archives.includes(archive)) refuse('no-such-archive', 'archive', archive, archives);
      requireKnown(id, own, rule.limits);
    }
  }
}

function requireKnown(id: string, own: Record<string, number>, defaults: Record<string, number>): void {
  for (const [name, value] of Object.entries(own)) {
    if (!Object.hasOwn(defaults, name)) refuse('no-such-limit', `${id} limit`, name, Object.keys(defaults));
    if (!Number.isFinite(value)) refuse('not-a-number', `${id} ${name}`, String(value), 'a finite number');
  }
}

function refuse(code: string, field: string, value: string, allowed: string | string[]): never {
  throw new DomainError(code, { field, value, allowed });
}
