import pino from 'pino';
import { env } from './env';

/** One JSON line an event. Never log a body, a cookie, a token or an address of a person. */
export const logger = pino({ level: env.LOG_LEVEL, base: undefined });
