import '../load-env';
import { spawnSync } from 'node:child_process';
import { prepareQueues } from '@/lib/server/queue';
import { sequelize } from '@/lib/server/database';

/** Brings the database up to date: our tables by sequelize-cli, then the queue's own. Repeats do no harm. */
const cli = spawnSync(process.execPath, ['--import', 'tsx', 'node_modules/sequelize-cli/lib/sequelize', 'db:migrate'], {
  stdio: 'inherit',
  env: process.env,
});
if (cli.status !== 0) process.exit(cli.status ?? 1);

try {
  await prepareQueues();
} finally {
  await sequelize.close();
}
