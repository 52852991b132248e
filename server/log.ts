import pino from 'pino';
import type { Config } from '@/server/config';

export type Log = pino.Logger;

/** The log of a process: JSON lines on standard output, without cookies, passwords or tokens. */
export function createLog(config: Pick<Config, 'logLevel'>, name: string): Log {
  return pino({
    name,
    level: config.logLevel,
    redact: [
      'password',
      '*.password',
      'token',
      '*.token',
      'headers.cookie',
      'headers.authorization',
      '*.headers.cookie',
    ],
  });
}
