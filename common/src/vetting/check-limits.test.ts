import { expect, test } from 'vitest';
import { DomainError } from '../physical/domain-error';
import { requireLimits } from './check-limits';
import { limitsOf, type RuleLimits, type StewardLimits } from './limits';
import { rules } from './rules/index';
import { answers, context, rows } from './rules/rows.test-support';
import { vet } from './vet';

const steps = rows({ sedimentationRateCmKyr: 2 }, { sedimentationRateCmKyr: 60 });
const jumps = (limits: Parameters<typeof requireLimits>[0], archive: 'ice' | 'lake') =>
  vet(context(steps, { limits, metadata: { ...answers, archive } }), {
    rules: rules.filter(({ id }) => id === 'V27'),
  }).length;

test('a limit for one archive goes before that for all, and that before the default', () => {
  const limits = { V27: { all: { factor: 100 }, byArchive: { lake: { factor: 5 } } } };
  expect(limitsOf({ limits }, 'V27', { factor: 10 }, 'lake')).toEqual({ factor: 5 });
  expect(limitsOf({ limits }, 'V27', { factor: 10 }, 'ice')).toEqual({ factor: 100 });
  expect(limitsOf({ limits }, 'V28', { factor: 10 }, 'lake')).toEqual({ factor: 10 });
});

test('a changed limit changes what is found, for its archive only', () => {
  expect(jumps({}, 'lake')).toBe(1);
  expect(jumps({ V27: { byArchive: { lake: { factor: 50 } } } }, 'lake')).toBe(0);
  expect(jumps({ V27: { byArchive: { lake: { factor: 50 } } } }, 'ice')).toBe(1);
  expect(jumps({ V27: { all: { factor: 50 } } }, 'ice')).toBe(0);
});

test('the defaults of every rule pass as changes for every archive', () => {
  const limits = Object.fromEntries(
    rules.flatMap(({ id, limits: all }) => (all ? [[id, { all, byArchive: { peat: all } }] as const] : [])),
  );
  expect(Object.keys(limits).length).toBeGreaterThan(20);
  expect(() => requireLimits(limits, rules)).not.toThrow();
});

const refused: [string, StewardLimits][] = [
  ['no-such-rule', { V99: { all: { factor: 3 } } }],
  ['no-limits', { V03: { all: { factor: 3 } } }],
  ['no-such-limit', { V27: { all: { faktor: 3 } } }],
  ['no-such-limit', { V27: { byArchive: { lake: { min: 3 } } } }],
  ['no-such-archive', { V27: { byArchive: { coral: { factor: 3 } } as RuleLimits['byArchive'] } }],
  ['not-a-number', { V27: { all: { factor: Infinity } } }],
];

test.each(refused)('a change that no rule would read is refused as %s', (code, limits) => {
  expect(() => requireLimits(limits, rules)).toThrow(expect.objectContaining({ code }) as DomainError);
});
