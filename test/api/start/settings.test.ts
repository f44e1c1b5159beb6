import { describe, expect, it } from 'vitest';
import { describeDatabase, readSettings } from '../../../api/start/settings.mjs';

const read = (env: NodeJS.ProcessEnv) => readSettings(env, '/srv/noonmark');

describe('readSettings', () => {
  it('serves this machine on port 8080 with its own database when nothing is set', () => {
    expect(read({})).toEqual({
      projectFolder: '/srv/noonmark',
      dataFolder: '/srv/noonmark/.noonmark',
      host: '127.0.0.1',
      port: 8080,
      localUrl: 'http://127.0.0.1:8080',
      publicUrl: 'http://127.0.0.1:8080',
      operatorDatabase: null,
      sessionSecret: null,
      isProduction: false,
    });
  });

  it('takes an empty variable as not set', () => {
    expect(read({ PORT: '', DATABASE_URL: '', PUBLIC_URL: '', NOONMARK_DATA: '' })).toEqual(
      read({}),
    );
  });

  it('lets the public address follow the port unless it is given', () => {
    expect(read({ PORT: '9000' }).publicUrl).toBe('http://127.0.0.1:9000');
    expect(read({ PORT: '9000', PUBLIC_URL: 'https://sun.example.gov/' })).toMatchObject({
      publicUrl: 'https://sun.example.gov',
      localUrl: 'http://127.0.0.1:9000',
    });
  });

  it('reaches a server on all addresses, or on an IPv6 one, by an address that a browser takes', () => {
    expect(read({ HOST: '0.0.0.0' }).localUrl).toBe('http://127.0.0.1:8080');
    expect(read({ HOST: '::1' }).localUrl).toBe('http://[::1]:8080');
  });

  it('resolves a relative data folder from the project, not from where it is started', () => {
    expect(read({ NOONMARK_DATA: 'data' }).dataFolder).toBe('/srv/noonmark/data');
    expect(read({ NOONMARK_DATA: '/var/noonmark' }).dataFolder).toBe('/var/noonmark');
  });

  it('lets the owner of a given database be the same role as the application', () => {
    const appUrl = 'postgresql://app:secret@db:5432/noonmark';
    const ownerUrl = 'postgresql://owner:secret@db:5432/noonmark';
    expect(read({ DATABASE_URL: appUrl }).operatorDatabase).toEqual({ appUrl, ownerUrl: appUrl });
    expect(read({ DATABASE_URL: appUrl, DATABASE_OWNER_URL: ownerUrl }).operatorDatabase).toEqual({
      appUrl,
      ownerUrl,
    });
  });

  it.each(['0', '65535', '80a', '-1', '8080.5', '1e3'])(
    'refuses PORT=%s in one sentence',
    (port) => {
      expect(() => read({ PORT: port })).toThrow(`PORT=${port} is no port`);
    },
  );

  it('refuses addresses that nothing can be reached at', () => {
    expect(() => read({ PUBLIC_URL: 'sun.example.gov' })).toThrow('must look like https://');
    expect(() => read({ DATABASE_URL: 'mysql://db/noonmark' })).toThrow(
      'must look like postgresql:',
    );
    expect(() => read({ DATABASE_OWNER_URL: 'postgresql://db/noonmark' })).toThrow('set both or');
  });

  it('does not repeat a database address, which may hold a password', () => {
    expect(() => read({ DATABASE_URL: 'postgresql://app:hunter2@db' })).toThrow(
      expect.not.objectContaining({ message: expect.stringContaining('hunter2') as unknown }),
    );
    expect(describeDatabase('postgresql://app:hunter2@db:5432/noonmark')).toBe('db:5432/noonmark');
  });
});
