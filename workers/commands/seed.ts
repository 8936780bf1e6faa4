import '../load-env';
import { sequelize } from '@/lib/server/database';
import { env } from '@/lib/server/env';
import { letViewerIn, seedBase } from '../seed/base';
import { seedProjects } from '../seed/projects';

/** Fills an empty installation with the demo scenario; run again, it adds what is missing and changes nothing else. */
async function main(): Promise<void> {
  const context = await seedBase(env.DEMO_ACCOUNTS_FILE);
  await seedProjects(context);
  await letViewerIn(context);
}

try {
  await main();
} finally {
  await sequelize.close();
}
