import type { PersonView, Role } from '@siltlight/common/wire/people';
import { hasRole } from '../shared/api/session';

export type Section = { title: string; path: string; key: string; roles?: Role[] };

/** The sections as tabs, each with the letter that opens it after `g`. */
const sections: readonly Section[] = [
  { title: 'Desk', path: '/desk', key: 'd' },
  { title: 'Intake', path: '/intake', key: 'i', roles: ['scientist', 'steward'] },
  { title: 'Holdings', path: '/holdings', key: 'h' },
  { title: 'Slices', path: '/slices', key: 's' },
  { title: 'Optics', path: '/optics', key: 'o' },
  { title: 'Estimates', path: '/estimates', key: 'e' },
  { title: 'Exports', path: '/exports', key: 'x' },
];

const inMenu: readonly Section[] = [
  { title: 'Profile and tokens', path: '/profile', key: 'p' },
  { title: 'Ledger', path: '/ledger', key: 'l', roles: ['steward', 'administrator'] },
  { title: 'Administration', path: '/administration', key: 'a', roles: ['administrator'] },
];

const mailbox: Section = { title: 'Mailbox', path: '/mailbox', key: 'm' };

const open = (person: PersonView) => (section: Section) =>
  !section.roles || hasRole(person, ...section.roles);

export const sectionsOf = (person: PersonView) => sections.filter(open(person));

export const menuOf = (person: PersonView, demo: boolean) =>
  (demo ? [...inMenu, mailbox] : inMenu).filter(open(person));

export const isWithin = (section: Section, pathname: string) =>
  pathname === section.path || pathname.startsWith(`${section.path}/`);
