import 'server-only';
import pino from 'pino';
import { env } from '@/lib/env';

/** One JSON line each. Nothing that opens a door, and no name or address, stands in a log. */
export const log = pino({
  level: env.LOG_LEVEL,
  base: undefined,
  timestamp: pino.stdTimeFunctions.isoTime,
  redact: {
    paths: ['password', 'token', 'code', 'link', 'cookie', 'authorization', 'email', 'to', 'name'].flatMap((field) => [
      field,
      `*.${field}`,
      `*.*.${field}`,
    ]),
    censor: '[kept out]',
  },
});
