import type { Role } from '@siltlight/common/wire/people';

export interface DemoAccount {
  email: string;
  name: string;
  initials: string;
  roles: Role[];
}

/** Invented people of the demo scenario. A second scientist and steward let four-eyes steps be tried. */
export const demoAccounts: readonly DemoAccount[] = [
  { email: 'scientist@siltlight.example', name: 'Ilka Vossberg', initials: 'IV', roles: ['scientist'] },
  { email: 'scientist2@siltlight.example', name: 'Tomas Arnhult', initials: 'TA', roles: ['scientist'] },
  { email: 'steward@siltlight.example', name: 'Mirela Castag', initials: 'MC', roles: ['steward'] },
  {
    email: 'steward2@siltlight.example',
    name: 'Joren Quade',
    initials: 'JQ',
    roles: ['steward', 'scientist'],
  },
  { email: 'modeller@siltlight.example', name: 'Pia Lindroth', initials: 'PL', roles: ['modeller'] },
  { email: 'admin@siltlight.example', name: 'Edo Marwick', initials: 'EM', roles: ['administrator'] },
];

const DEFAULT_PASSWORD = 'invented dust over invented ice';

/** The password that the demo accounts get at the first seed. Only the demo has known passwords. */
export const demoPasswordOf = (settings: { demoPassword: string | undefined }): string =>
  settings.demoPassword ?? DEFAULT_PASSWORD;
