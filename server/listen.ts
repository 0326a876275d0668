import { createServer, type RequestListener } from 'node:http';

interface Listening {
  port: number;
  /** Lets running requests end, for a while. */
  close(): Promise<void>;
}

export async function listen(
  handler: RequestListener,
  { host, port, graceMs = 5_000 }: { host: string; port: number; graceMs?: number },
): Promise<Listening> {
  const server = createServer(handler);
  await new Promise<void>((resolve, reject) => {
    server.once('error', (error) => reject(explain(error, { host, port })));
    server.listen(port, host, resolve);
  });
  const address = server.address();
  return {
    port: typeof address === 'object' && address ? address.port : port,
    close: () =>
      new Promise((resolve) => {
        const insist = setTimeout(() => server.closeAllConnections(), graceMs);
        server.close(() => {
          clearTimeout(insist);
          resolve();
        });
        server.closeIdleConnections();
      }),
  };
}

function explain(error: Error, { host, port }: { host: string; port: number }): Error {
  if (!('code' in error) || error.code !== 'EADDRINUSE') return error;
  return new Error(`The port ${port} on ${host} is in use: set PORT to a free one.`);
}
