import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { RouteConfigEntry } from '@react-router/dev/routes';
import routes from '../app/routes';
import { projectRoot } from '../db/setup/paths';

/** One address of the product with the modules that answer it, the frame first. */
export interface RouteRow {
  path: string;
  /** Ids of the modules, as a request for the data of some alone names them. */
  ids: string[];
  reads: boolean;
  writes: boolean;
  /** Shows a page, rather than answering a program. */
  isPage: boolean;
}

/** Every address of `app/routes.ts`, with what its modules export. */
export async function listRoutes(): Promise<RouteRow[]> {
  const rows = new Map<string, RouteRow>();
  for (const { path, file } of flatten(await routes, '')) {
    const source = readFileSync(join(projectRoot, 'app', file), 'utf8');
    const row = rows.get(path) ?? { path, ids: [], reads: false, writes: false, isPage: false };
    const isPage = /^export default /m.test(source);
    rows.set(path, {
      path,
      ids: [...row.ids, file.replace(/\.tsx?$/, '')],
      reads: row.reads || isPage || exported(source, 'loader'),
      writes: row.writes || exported(source, 'action'),
      isPage: row.isPage || isPage,
    });
  }
  return [...rows.values()];
}

function flatten(
  entries: readonly RouteConfigEntry[],
  base: string,
): { path: string; file: string }[] {
  return entries.flatMap((entry) => {
    const path = [base, entry.path].filter(Boolean).join('/');
    return [{ path: `/${path}`, file: entry.file }, ...flatten(entry.children ?? [], path)];
  });
}

const exported = (source: string, name: string) =>
  new RegExp(
    `^export (const|function|async function) ${name}\\b|^export \\{[^}]*\\b${name}\\b`,
    'm',
  ).test(source);
