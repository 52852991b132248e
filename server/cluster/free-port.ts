import { createServer } from 'node:net';

/**
 * A TCP port nothing listens on at this moment.
 *
 * @param wanted  Tried first when given.
 */
export async function freePort(host: string, wanted?: number): Promise<number> {
  if (wanted !== undefined && (await portIfFree(host, wanted)) !== null) return wanted;
  const port = await portIfFree(host, 0);
  if (port === null) throw new Error(`No free TCP port on ${host}`);
  return port;
}

function portIfFree(host: string, port: number): Promise<number | null> {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(null));
    server.listen({ host, port, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(typeof address === 'object' && address ? address.port : null));
    });
  });
}
