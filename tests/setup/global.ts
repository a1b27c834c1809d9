import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { migrate } from '../../db/migrate';
import { startCluster } from '../../db/setup/cluster';
import { createDatabase } from '../../db/setup/databases';
import { startMailFake } from '../../db/setup/mail-fake';
import { makeTestFolder, removeTestFolder } from '../../db/setup/test-folder';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Where databases of this run's own cluster are made and dropped. */
    adminUrl: string;
    smtpUrl: string;
    mailFolder: string;
  }
}

/** The migrated database that every test file gets a copy of. */
export const TEMPLATE = 'template_valveside';

/** Once a run: a PostgreSQL cluster of its own, migrated once, and a mail fake. */
export default async function setup(project: TestProject) {
  const folder = await makeTestFolder();
  const cluster = await startCluster({ parent: folder, name: 'cluster', durable: false });
  await createDatabase(cluster.url('postgres'), TEMPLATE);
  await migrate(cluster.url(TEMPLATE));
  const mailFolder = join(folder, 'mail');
  const mail = await startMailFake({ folder: mailFolder });
  project.provide('adminUrl', cluster.url('postgres'));
  project.provide('smtpUrl', mail.url);
  project.provide('mailFolder', mailFolder);
  return async () => {
    await mail.stop();
    await cluster.stop();
    await removeTestFolder(folder);
  };
}
