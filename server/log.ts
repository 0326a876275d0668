import { type Logger, pino } from 'pino';

/** One JSON line an event; secrets never reach it. */
export function createLog(level: string): Logger {
  return pino({
    level,
    base: { service: 'clauseway' },
    timestamp: pino.stdTimeFunctions.isoTime,
    redact: ['password', '*.password', 'token', '*.token', 'headers', '*.headers'],
  });
}
