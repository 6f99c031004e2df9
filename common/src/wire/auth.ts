import { z } from 'zod';
import { emailAddress, personName, personView } from './people';

/**
 * Signing in, sessions and personal access tokens, as they cross the wire.
 *
 * A password is taken exactly as typed: never trimmed, cut or normalised. The limits of a new one are
 * 15 to 256 characters (15: NIST SP 800-63B revision 4 where the password is the only factor; 256: ours).
 */

export const PASSWORD_MIN_CHARACTERS = 15;
export const PASSWORD_MAX_CHARACTERS = 256;

/** An existing password: only bounded, so that a wrong one is answered as wrong and not as malformed. */
const presentPassword = z.string().min(1, 'Give the password.').max(1024, 'No password is that long.');

/** The characters are counted as code points, so that an emoji is one. The block list is checked by the service. */
export const newPassword = z
  .string()
  .max(1024, 'A password has at most 256 characters.')
  .refine((text) => [...text].length >= PASSWORD_MIN_CHARACTERS, {
    message: 'A password has at least 15 characters: several unrelated words do well.',
  })
  .refine((text) => [...text].length <= PASSWORD_MAX_CHARACTERS, {
    message: 'A password has at most 256 characters.',
  })
  .refine((text) => !/\p{Cs}/u.test(text), {
    message: 'The password holds half of a character: type it again.',
  });

const oneTimeToken = z.string().min(1, 'The link is incomplete: open it again from the mail.').max(200);

export const signInRequest = z.strictObject({
  email: z.string().trim().min(1).max(254),
  password: presentPassword,
});
export type SignInRequest = z.infer<typeof signInRequest>;

export const sessionAnswer = z.object({
  person: personView,
  csrfToken: z
    .string()
    .meta({ description: 'Send it as X-CSRF-Token with every call that changes something.' }),
  demo: z.boolean(),
});
export type SessionAnswer = z.infer<typeof sessionAnswer>;

/** What the sign-in page needs to know before anybody is signed in. */
export const signInOptions = z.object({
  demo: z.boolean(),
  demoAccounts: z.array(z.object({ email: z.string(), name: z.string(), roles: z.array(z.string()) })),
});
export type SignInOptions = z.infer<typeof signInOptions>;

export const acceptInvitation = z.strictObject({ token: oneTimeToken, password: newPassword });
export type AcceptInvitation = z.infer<typeof acceptInvitation>;

export const passwordResetRequest = z.strictObject({ email: emailAddress });
export const passwordResetConfirm = z.strictObject({ token: oneTimeToken, password: newPassword });
export type PasswordResetConfirm = z.infer<typeof passwordResetConfirm>;

export const firstAdministrator = z.strictObject({
  token: oneTimeToken,
  name: personName,
  email: emailAddress,
  password: newPassword,
});
export type FirstAdministrator = z.infer<typeof firstAdministrator>;

/** Whose account a link was for, so that the sign-in form need not ask again. */
export const linkUsed = z.object({ email: z.string() });

/** The same for everybody, known here or not. */
export const passwordResetAsked = z.object({ detail: z.string() });

export const changePassword = z.strictObject({ presentPassword, newPassword });
export type ChangePassword = z.infer<typeof changePassword>;

export const sessionView = z.object({
  id: z.string(),
  current: z.boolean(),
  createdAt: z.string(),
  lastSeenAt: z.string(),
  expiresAt: z.string(),
  browser: z.string(),
  address: z.string(),
});
export type SessionView = z.infer<typeof sessionView>;

export const sessionList = z.object({ items: z.array(sessionView) });

/** Each scope stands for itself: a token with `write` alone cannot read. */
export const SCOPES = ['read', 'write', 'admin'] as const;
export const scope = z.enum(SCOPES);
export type Scope = z.infer<typeof scope>;

export const accessTokenRequest = z.strictObject({
  name: personName,
  scopes: z
    .array(scope)
    .min(1, 'Give at least one scope: read, write or admin.')
    .max(SCOPES.length)
    .refine((scopes) => new Set(scopes).size === scopes.length, 'Name each scope once.'),
  expiresInDays: z.int().min(1).max(365),
  password: presentPassword
    .optional()
    .meta({ description: 'Needed when you signed in longer than 30 minutes ago.' }),
});
export type AccessTokenRequest = z.infer<typeof accessTokenRequest>;

export const accessTokenView = z.object({
  id: z.string(),
  name: z.string(),
  scopes: z.array(scope),
  createdAt: z.string(),
  expiresAt: z.string(),
  lastUsedAt: z.string().nullable(),
});
export type AccessTokenView = z.infer<typeof accessTokenView>;

export const accessTokenList = z.object({ items: z.array(accessTokenView) });

export const accessTokenCreated = accessTokenView.extend({
  token: z.string().meta({ description: 'Shown this once; only its hash is kept.' }),
});
export type AccessTokenCreated = z.infer<typeof accessTokenCreated>;
