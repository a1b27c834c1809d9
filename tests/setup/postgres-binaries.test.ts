import { chmodSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { findPostgresBinaries } from '../../db/setup/postgres-binaries';

const folder = mkdtempSync(join(tmpdir(), 'valveside-binaries-'));

function version(name: string, programs: readonly string[]): void {
  const bin = join(folder, name, 'bin');
  mkdirSync(bin, { recursive: true });
  for (const program of programs) {
    writeFileSync(join(bin, program), '');
    chmodSync(join(bin, program), 0o755);
  }
}

afterAll(() => rmSync(folder, { recursive: true }));

test('the highest version that has a server is taken, by number and not by letters', async () => {
  version('9', ['initdb', 'pg_ctl', 'postgres']);
  version('15', ['initdb', 'pg_ctl', 'postgres']);
  version('17', ['psql']);
  expect(await findPostgresBinaries(folder)).toBe(join(folder, '15', 'bin'));
});
