import type { PersonView, Role } from '@siltlight/common/wire/people';
import { isWithin, menuOf, sectionsOf } from './sections';

const person = (...roles: Role[]): PersonView => ({
  id: 'p',
  name: 'P',
  initials: 'P',
  email: 'p@example.org',
  orcid: null,
  roles,
  state: 'active',
  createdAt: '2026-01-01T00:00:00.000Z',
  version: 1,
});
const titles = (sections: readonly { title: string }[]) => sections.map((section) => section.title);

test('a modeller sees no Intake, a scientist does', () => {
  expect(titles(sectionsOf(person('modeller')))).toEqual([
    'Desk',
    'Holdings',
    'Slices',
    'Optics',
    'Estimates',
    'Exports',
  ]);
  expect(titles(sectionsOf(person('scientist')))).toContain('Intake');
});

test('the mailbox belongs to the demo, ledger and administration to their roles', () => {
  expect(titles(menuOf(person('scientist'), false))).toEqual(['Profile and tokens']);
  expect(titles(menuOf(person('steward'), true))).toEqual(['Profile and tokens', 'Ledger', 'Mailbox']);
  expect(titles(menuOf(person('administrator'), false))).toContain('Administration');
});

test('no two sections share the letter that opens them', () => {
  const all = person('scientist', 'steward', 'modeller', 'administrator');
  const keys = [...sectionsOf(all), ...menuOf(all, true)].map((section) => section.key);
  expect(new Set(keys).size).toBe(keys.length);
});

test('a page inside a section marks its tab, a similar name does not', () => {
  const section = { title: 'Slices', path: '/slices', key: 's' };
  expect(isWithin(section, '/slices/lgm')).toBe(true);
  expect(isWithin(section, '/slices-old')).toBe(false);
});
