import net from 'node:net';
import { describe, expect, it, onTestFinished } from 'vitest';
import { describeListener, findFreePort, isPortFree } from '../../../api/start/ports.mjs';

async function listenSomewhere(): Promise<number> {
  const server = net.createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  onTestFinished(() => void server.close());
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('A TCP port was expected.');
  return address.port;
}

describe('ports', () => {
  it('sees that a port is taken, and leaves a free one free', async () => {
    const takenPort = await listenSomewhere();
    expect(await isPortFree(takenPort)).toBe(false);
    const freePort = await findFreePort();
    expect(await isPortFree(freePort)).toBe(true);
    expect(await isPortFree(freePort)).toBe(true);
  });

  it('passes over a taken port', async () => {
    const takenPort = await listenSomewhere();
    const port = await findFreePort(takenPort);
    expect(port).toBeGreaterThan(takenPort);
  });

  it('names the program that listens on a port', async () => {
    const takenPort = await listenSomewhere();
    expect(describeListener(takenPort)).toContain(`process ${process.pid}`);
    expect(describeListener(await findFreePort())).toBe('');
  });

  it('says when HOST is no address of this machine', async () => {
    // 192.0.2.0/24 is kept for documentation (RFC 5737).
    await expect(isPortFree(8080, '192.0.2.1')).rejects.toThrow('no address of this machine');
  });
});
