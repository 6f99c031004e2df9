import * as fc from 'fast-check';
import { newPassword } from '@siltlight/common/wire/auth';
import { COMMON_PASSWORDS } from './common-passwords';
import { hashPassword, passwordMatches } from './password-hashing';
import { reasonToRefuse } from './password-rules';

// From memory: long passwords that leaks show again and again, and plain variations of them.
const KNOWN = [
  'passwordpassword',
  'password12345678',
  'Password123456789',
  '123456789012345',
  'qwertyuiopasdfgh',
  'qwerty123456789',
  '1q2w3e4r5t6y7u8i',
  '1qaz2wsx3edc4rfv',
  'aaaaaaaaaaaaaaaa',
  'abcabcabcabcabcabc',
  'iloveyouiloveyou',
  'letmeinletmein12',
  'administrator123',
  'P@ssw0rdP@ssw0rd',
  'siltlightsiltlight',
  'Siltlight-2026-demo',
  'abcdefghijklmnop',
  'welcome123welcome',
  'sunshineprincess',
  '111111111111111',
  'zxcvbnmasdfghjkl',
  'changeme12345678!',
];

test('the block list holds at least 3,000 entries', () => {
  expect(COMMON_PASSWORDS.size).toBeGreaterThanOrEqual(3000);
});

test.each(KNOWN)('%s is refused with a reason', (password) => {
  expect(reasonToRefuse(password)).toEqual(expect.stringMatching(/^it /));
});

test.each([
  'violet tundra ladder nineteen',
  'Kaffee mit Löss um halb vier',
  '🦊🌋🧊🪨🌾🐚🌪️🧭🏔️🔭🌒🌊🪵🐫🦣',
  'mWq8-tLz5-rYc2-vHn7',
])('%s is taken', (password) => {
  expect(newPassword.safeParse(password).success).toBe(true);
  expect(reasonToRefuse(password)).toBeNull();
});

test('a password made of the person’s own name and address is refused', () => {
  expect(reasonToRefuse('ilsevandermeer1987', ['Ilse van der Meer', 'ilse@example.org'])).not.toBeNull();
});

test('14 characters are too few, 15 and 256 are enough, 257 are too many, and emoji count as one', () => {
  const accepted = (text: string) => newPassword.safeParse(text).success;
  expect([14, 15, 64, 256, 257].map((length) => accepted('ö'.repeat(length)))).toEqual([
    false,
    true,
    true,
    true,
    false,
  ]);
  expect(accepted('🧊'.repeat(14))).toBe(false);
  expect(accepted('🧊'.repeat(15))).toBe(true);
});

test('no text makes the rules fail or hang', () => {
  fc.assert(
    fc.property(fc.string({ maxLength: 256, unit: 'binary' }), (text) => {
      const reason = reasonToRefuse(text);
      return reason === null || reason.length > 0;
    }),
    { numRuns: 100 },
  );
});

test('a password is stored as argon2id at the stated cost and is never cut', async () => {
  const long = 'x'.repeat(72);
  const stored = await hashPassword(`${long}a`);
  expect(stored).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  expect(await passwordMatches(stored, `${long}a`)).toBe(true);
  expect(await passwordMatches(stored, `${long}b`)).toBe(false);
  expect(await passwordMatches(null, 'nobody signs in with this')).toBe(false);
});
