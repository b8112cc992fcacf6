import { type DestinationStream, type Logger, pino } from 'pino';
import type { Config } from './config.js';

/** What must not get into a log, whichever object it comes with; a failed query carries its values. */
const REDACTED = [
  'password',
  '*.password',
  '*.passwordHash',
  '*.secret',
  '*.token',
  'req.headers',
  'res.headers',
  'err.query',
  'err.parameters',
];

/** The program's log: a line of JSON for each event. */
export function createLog(level: Config['logLevel'], destination?: DestinationStream): Logger {
  const options = { level, redact: REDACTED };
  return destination ? pino(options, destination) : pino(options);
}
