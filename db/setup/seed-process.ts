/** The process that `seed` starts: fills the database that the environment names, and ends. */
import { sequelize } from '../../app/models/database.server';
import { seedDemo } from '../seed';

await seedDemo();
await sequelize.close();
