import type { CookieOptions, Request } from 'express';

/** The `__Host-` prefix binds a cookie to this very host and demands Secure, which plain http cannot give. */
export interface SessionCookie {
  name: string;
  options: CookieOptions;
}

export function sessionCookie(publicUrl: string): SessionCookie {
  const secure = publicUrl.startsWith('https:');
  return {
    name: secure ? '__Host-siltlight' : 'siltlight',
    options: { httpOnly: true, secure, sameSite: 'strict', path: '/' },
  };
}

export function cookieValue(request: Request, name: string): string | null {
  for (const pair of (request.headers.cookie ?? '').split(';')) {
    const [key, ...value] = pair.trim().split('=');
    if (key === name) return value.join('=');
  }
  return null;
}
