import pino from 'pino';

/** The server's log, one JSON line an entry. Nothing secret is ever put into it. */
export const log = pino({ name: 'valveside', base: undefined });
