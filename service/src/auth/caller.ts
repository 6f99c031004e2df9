import type { Request } from 'express';
import type { Caller } from './sessions.service';

/** The address is the connection's own unless a proxy has been configured as trusted. */
export function callerOf(request: Request): Caller {
  return { address: request.ip ?? 'unknown', browser: request.get('user-agent') ?? 'unknown' };
}
