import pino from 'pino';
import { logLevel } from '~/env.server';

/** The server's log, one JSON line an entry. Nothing secret is ever put into it. */
export const log = pino({ name: 'valveside', base: undefined, level: logLevel() });
