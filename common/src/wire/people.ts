import { z } from 'zod';
import { pageOf, personMark } from './shared';

/**
 * People of one installation, as they cross the wire.
 *
 * Times are UTC, ISO 8601, of fixed width. A role is what a person may do; a person may hold several.
 */

export const ROLES = ['scientist', 'steward', 'modeller', 'administrator'] as const;
export const role = z.enum(ROLES).meta({ description: 'What a person may do; a person may hold several.' });
export type Role = z.infer<typeof role>;

/** Invited: has no password yet. Disabled: keeps name and history, cannot sign in. */
export const personState = z.enum(['invited', 'active', 'disabled']);
export type PersonState = z.infer<typeof personState>;

/** A text that becomes part of mails, citations and file names: no control, bidi or half characters. */
const PLAIN_LINE = /^[^\p{Cc}\p{Cs}\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]*$/u;

export const personName = z
  .string()
  .trim()
  .min(1, 'Give a name.')
  .max(120, 'A name has at most 120 characters.')
  .regex(PLAIN_LINE, 'A name is one line of plain characters: leave out line breaks and direction marks.');

/** Addresses are compared in lower case; 254 characters is the longest that mail can carry (RFC 5321, from memory). */
export const emailAddress = z
  .string()
  .trim()
  .max(254, 'An e-mail address has at most 254 characters.')
  .pipe(z.email('Give an e-mail address such as name@example.org.'))
  .transform((address) => address.toLowerCase());

/**
 * True when the last character of an ORCID iD fits the fifteen digits before it.
 * ISO 7064 MOD 11-2, as ORCID states for its identifiers (from memory).
 */
export function orcidChecksOut(orcid: string): boolean {
  const digits = orcid.replaceAll('-', '');
  const total = [...digits.slice(0, 15)].reduce((sum, digit) => (sum + Number(digit)) * 2, 0);
  const check = (12 - (total % 11)) % 11;
  return digits[15] === (check === 10 ? 'X' : String(check));
}

export const orcid = z
  .string()
  .regex(/^\d{4}-\d{4}-\d{4}-\d{3}[\dX]$/, 'Write the iD as 0000-0002-1825-0097.')
  .refine(orcidChecksOut, 'The last character does not fit the digits before it: look for a typing error.');

const rolesGiven = z
  .array(role)
  .max(ROLES.length)
  .refine((roles) => new Set(roles).size === roles.length, 'Name each role once.');

export const personView = personMark.extend({
  email: z.string(),
  orcid: z.string().nullable(),
  roles: z.array(role),
  state: personState,
  createdAt: z.string(),
  version: z.int().meta({ description: 'Grows with each change; send it back in If-Match or in the body.' }),
});
export type PersonView = z.infer<typeof personView>;

export const peoplePage = pageOf(personView);

/** Absent fields stay as they are. `version` may be given in If-Match instead. */
export const changePerson = z
  .strictObject({
    roles: rolesGiven.optional(),
    disabled: z.boolean().optional(),
    version: z.int().min(1).optional(),
  })
  .refine((body) => body.roles !== undefined || body.disabled !== undefined, {
    message: 'Say what to change: roles, disabled, or both.',
  });
export type ChangePerson = z.infer<typeof changePerson>;

export const changeMe = z
  .strictObject({
    name: personName.optional(),
    orcid: orcid.nullable().optional(),
    version: z.int().min(1).optional(),
  })
  .refine((body) => body.name !== undefined || body.orcid !== undefined, {
    message: 'Say what to change: name, orcid, or both.',
  });
export type ChangeMe = z.infer<typeof changeMe>;

export const inviteRequest = z.strictObject({
  email: emailAddress,
  name: personName,
  roles: rolesGiven.min(1, 'Give at least one role.'),
});
export type InviteRequest = z.infer<typeof inviteRequest>;

export const invitationView = z.object({ person: personView, expiresAt: z.string() });
export type InvitationView = z.infer<typeof invitationView>;
