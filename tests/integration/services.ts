import net from 'node:net';

/** Says at once what to start where the services are away, instead of a hundred refused connections. */
export default async function setup(): Promise<void> {
  for (const name of ['DATABASE_URL', 'S3_ENDPOINT', 'SMTP_URL', 'MAILBOX_URL']) {
    const value = process.env[name];
    if (!value)
      throw new Error(`${name} is not set. Run "npm test -- integration", which starts what these tests need.`);
    const { hostname, port } = new URL(value);
    if (!(await answers(hostname, Number(port))))
      throw new Error(`Nothing answers at ${hostname}:${port} (${name}). Run "npm test -- integration".`);
  }
}

function answers(host: string, port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const socket = net.connect({ host, port });
    socket.once('connect', () => {
      socket.destroy();
      resolve(true);
    });
    socket.once('error', () => resolve(false));
  });
}
