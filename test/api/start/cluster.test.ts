import { execFileSync, spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { describe, expect, it, onTestFinished } from 'vitest';
import {
  POSTGRES_PROGRAMS,
  SUPERUSER,
  makeClusterFiles,
} from '../../../api/start/cluster-files.mjs';
import type { ClusterPlace } from '../../../api/start/cluster-place.mjs';
import { findClusterPlace, outsideFolderFor } from '../../../api/start/cluster-place.mjs';
import { isPostmasterOf, startCluster } from '../../../api/start/cluster.mjs';
import { openDataFolder } from '../../../api/start/data-folder.mjs';
import { APP_ROLE, databaseUrl, makeDatabase, makeRoles } from '../../../api/start/database.mjs';
import { Lifetime } from '../../../api/start/lifetime.mjs';
import { startTicksOf } from '../../../api/start/lock-file.mjs';
import { startOwnDatabase } from '../../../api/start/own-database.mjs';
import { makeTemporaryFolder } from './temporary-folder.ts';

/** The folder is asked for first, so that it is removed after the programs that use it have ended. */
function prepareTest(): { dataFolder: string; lifetime: Lifetime } {
  const dataFolder = makeTemporaryFolder();
  const lifetime = new Lifetime();
  onTestFinished(() => lifetime.stop());
  return { dataFolder, lifetime };
}

async function makeTestCluster() {
  const { dataFolder, lifetime } = prepareTest();
  const place: ClusterPlace = await findClusterPlace(lifetime, dataFolder);
  await makeClusterFiles(lifetime, place, 'test');
  const options = { logFile: path.join(dataFolder, 'postgresql.log'), isTest: true };
  return { lifetime, place, options };
}

function query(url: string, sql: string): string {
  const args = ['--no-psqlrc', '--tuples-only', '--no-align', '--no-password'];
  return execFileSync(
    `${POSTGRES_PROGRAMS}/psql`,
    [...args, `--dbname=${url}`, `--command=${sql}`],
    {
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'pipe'],
    },
  ).trim();
}

const adminUrl = (port: number) => databaseUrl({ role: SUPERUSER, port, database: 'postgres' });

describe('a cluster of our own', () => {
  it('starts again with its data after its server was killed', async () => {
    const { lifetime, place, options: testOptions } = await makeTestCluster();
    // As with real data: a test cluster may lose what it has just been given.
    const options = { ...testOptions, isTest: false };
    const first = await startCluster(lifetime, place, options);
    query(adminUrl(first.port), 'create table kept as select 42 as answer');
    process.kill(first.pid, 'SIGKILL');
    await first.ended;
    expect(existsSync(path.join(place.folder, 'postmaster.pid'))).toBe(true);

    const second = await startCluster(lifetime, { ...place, port: first.port }, options);
    expect(second.port).toBe(first.port);
    expect(query(adminUrl(second.port), 'select answer from kept')).toBe('42');
    await second.stop();
    expect(existsSync(path.join(place.folder, 'postmaster.pid'))).toBe(false);
  });

  it('starts although an unrelated process has the number of its dead server', async () => {
    const { lifetime, place, options } = await makeTestCluster();
    // The user who runs the cluster must be the sleeper's too, else PostgreSQL doesn't mind it.
    const identity = place.asUser
      ? [`--reuid=${place.asUser}`, `--regid=${place.asUser}`, '--init-groups']
      : [];
    const sleeper = spawn('setpriv', [...identity, 'sleep', '60'], { stdio: 'ignore' });
    onTestFinished(() => void sleeper.kill());
    const pid = sleeper.pid ?? 0;
    writeFileSync(path.join(place.folder, 'postmaster.pid'), `${pid}\n${place.folder}\n`);
    expect(isPostmasterOf(pid, place.folder)).toBe(false);

    const { port, pid: postmasterPid } = await startCluster(lifetime, place, options);
    expect(query(adminUrl(port), 'select 1')).toBe('1');
    expect(isPostmasterOf(postmasterPid, place.folder)).toBe(true);
  });

  it('moves to another port when somebody has taken its own', async () => {
    const { lifetime, place, options } = await makeTestCluster();
    const server = net.createServer();
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    onTestFinished(() => void server.close());
    const address = server.address();
    const takenPort = typeof address === 'object' ? (address?.port ?? 0) : 0;

    const { port } = await startCluster(lifetime, { ...place, port: takenPort }, options);
    expect(port).not.toBe(takenPort);
    expect(query(adminUrl(port), 'select 1')).toBe('1');
  });

  it('is made afresh when the first start was interrupted half-way', async () => {
    const { lifetime, dataFolder } = prepareTest();
    const place = await findClusterPlace(lifetime, dataFolder);
    const partialFolder = `${place.folder}.partial-1`;
    mkdirSync(partialFolder);
    writeFileSync(path.join(partialFolder, 'PG_VERSION'), '15\n');
    writeFileSync(`${partialFolder}.password`, 'left behind');

    expect(await makeClusterFiles(lifetime, place, 'test')).toBe(true);
    expect(existsSync(path.join(place.folder, 'global/pg_control'))).toBe(true);
    expect(existsSync(partialFolder)).toBe(false);
    expect(existsSync(`${partialFolder}.password`)).toBe(false);
    expect(await makeClusterFiles(lifetime, place, 'test')).toBe(false);
  });

  it('leaves nothing that looks like a cluster when it is stopped while being made', async () => {
    const { lifetime, dataFolder } = prepareTest();
    const place = await findClusterPlace(lifetime, dataFolder);
    const making = makeClusterFiles(lifetime, place, 'test');
    await lifetime.stop();
    await expect(making).rejects.toThrow();
    expect(readdirSync(path.dirname(place.folder))).toEqual([]);
  });

  it('of another version of PostgreSQL is not touched', async () => {
    const { lifetime, dataFolder } = prepareTest();
    const place = await findClusterPlace(lifetime, dataFolder);
    mkdirSync(place.folder);
    writeFileSync(path.join(place.folder, 'PG_VERSION'), '14\n');
    await expect(makeClusterFiles(lifetime, place, 'test')).rejects.toThrow('PostgreSQL 14');
  });

  it('ends with the lifetime that started it', async () => {
    const { lifetime, place, options } = await makeTestCluster();
    const { pid } = await startCluster(lifetime, place, options);
    await lifetime.stop();
    expect(startTicksOf(pid)).toBeNull();
    expect(readFileSync(options.logFile, 'utf8')).toContain('database system is shut down');
  });
});

describe('the database of a data folder', () => {
  it('lets the application change rows, but neither the schema nor anything without its password', async () => {
    const { lifetime, dataFolder } = prepareTest();
    openDataFolder(dataFolder);
    const { connection, port } = await startOwnDatabase(lifetime, dataFolder);
    query(connection.ownerUrl, 'create table parcel (id serial primary key, place geometry)');
    query(connection.appUrl, 'insert into parcel (place) values (st_makepoint(1, 2))');
    expect(query(connection.appUrl, 'select st_astext(place) from parcel')).toBe('POINT(1 2)');
    expect(() => query(connection.appUrl, 'drop table parcel')).toThrow('must be owner');
    expect(() => query(connection.appUrl, 'create table mine ()')).toThrow('permission denied');
    expect(() =>
      query(databaseUrl({ role: APP_ROLE, password: 'guess', port }), 'select 1'),
    ).toThrow('password authentication failed');
    expect(() => query(adminUrl(port), 'select 1')).toThrow('no password supplied');
  });

  it('can be set up again and again', async () => {
    const { lifetime, place, options } = await makeTestCluster();
    const { port } = await startCluster(lifetime, place, options);
    for (const password of ['first', 'second']) {
      await makeRoles(lifetime, { port }, { ownerPassword: password, appPassword: password });
      await makeDatabase(lifetime, { port }, 'noonmark');
    }
    expect(query(databaseUrl({ role: APP_ROLE, port }), 'select current_user')).toBe(APP_ROLE);
  });
});

describe('outsideFolderFor', () => {
  it('gives each data folder its own place, and always the same', () => {
    expect(outsideFolderFor('/root/a/.noonmark')).toMatch(
      /^\/var\/lib\/noonmark\/[0-9a-f]{12}\/cluster$/,
    );
    expect(outsideFolderFor('/root/a/.noonmark')).not.toBe(outsideFolderFor('/root/b/.noonmark'));
  });
});
