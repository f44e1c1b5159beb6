import { once } from 'node:events';
import type { Express } from 'express';

/** An application that listens on a free port of this machine. */
export interface ListeningServer {
  port: number;
  close: () => Promise<void>;
}

export async function listen(app: Express): Promise<ListeningServer> {
  const server = app.listen(0, '127.0.0.1');
  await once(server, 'listening');
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The server has no port.');
  return {
    port: address.port,
    close: async () => {
      server.close();
      await once(server, 'close');
    },
  };
}
