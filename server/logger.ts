import {
  type DestinationStream,
  type Logger as PinoLogger,
  pino,
  stdSerializers,
  stdTimeFunctions,
} from 'pino';
import type { LogLevel } from './config';

export type Logger = PinoLogger;

// Whatever way they come in: tokens, passwords and the text of entries have no business in a log.
const secretPaths = [
  'password',
  'token',
  'authorization',
  'cookie',
  'body',
  '*.password',
  '*.token',
  '*.authorization',
  '*.cookie',
  '*.body',
  'req.headers.authorization',
  'req.headers.cookie',
  'res.headers["set-cookie"]',
];

/** One JSON object per line, times in ISO 8601, to standard output unless told otherwise. */
export function createLogger(level: LogLevel, destination?: DestinationStream): Logger {
  const options = {
    level,
    base: {},
    timestamp: stdTimeFunctions.isoTime,
    redact: { paths: secretPaths, censor: '(not logged)' },
    serializers: { error: stdSerializers.err, err: stdSerializers.err },
  };
  return destination === undefined ? pino(options) : pino(options, destination);
}
