import '../load-env';
import { sequelize } from '@/lib/server/database';
import { checkSignOffs } from '@/lib/server/sign-offs/check-sign-offs';

/**
 * Works out the hash of every signed revision anew and says whether it is still the one that was signed; with a revision's id as
 * argument, of that one alone. Leaves with 1 where one is not.
 */
try {
  const checked = await checkSignOffs(process.argv[2]);
  for (const { holds, revisionId, decision, signerName, signedAt, sha256, storedSha256 } of checked) {
    const deed = decision === 'accepted' ? 'accepted' : 'asked for changes to';
    const verdict = holds ? `holds    ${sha256}` : `BROKEN   signed ${sha256}, stored ${storedSha256}`;
    console.log(`${verdict}  ${signerName} ${deed} revision ${revisionId} on ${signedAt.toISOString()}`);
  }
  console.log(`${checked.length} sign-offs checked.`);
  if (checked.some(({ holds }) => !holds)) process.exitCode = 1;
} finally {
  await sequelize.close();
}
