import { mkdirSync } from 'node:fs';
import S3rver from 's3rver';

/**
 * The local stand-in for the object store: s3rver on loopback, with its objects in a folder. Never a test of security: it
 * accepts any signature. Arguments: port, folder, bucket.
 */
const [port, directory, bucket] = process.argv.slice(2);
mkdirSync(directory, { recursive: true });

const server = new S3rver({
  address: '127.0.0.1',
  port: Number(port),
  directory,
  silent: true,
  configureBuckets: [{ name: bucket }],
});
await server.run();
console.log(`object store on port ${port}, bucket ${bucket}`);

for (const signal of ['SIGTERM', 'SIGINT'])
  process.on(signal, async () => {
    await server.close();
    process.exit(0);
  });
