import { readFileSync, readdirSync, readlinkSync } from 'node:fs';
import net from 'node:net';

import { Problem, errorCode } from './problem.mjs';

/** Below the range that systems take for outgoing connections, so that it stays ours. */
const FIRST_DATABASE_PORT = 25_432;
const PORTS_TO_TRY = 500;

/**
 * @param {number} port
 * @param {string} host
 * @returns {Promise<boolean>}
 */
export async function isPortFree(port, host = '127.0.0.1') {
  const server = net.createServer();
  try {
    await new Promise((resolve, reject) => {
      server.once('error', reject);
      server.listen({ port, host, exclusive: true }, () => resolve(undefined));
    });
    return true;
  } catch (error) {
    if (errorCode(error) === 'EADDRINUSE') return false;
    if (errorCode(error) === 'EACCES') {
      throw new Problem(`Port ${port} is reserved for root. Choose another: PORT=8080 npm start`);
    }
    if (errorCode(error) === 'EADDRNOTAVAIL' || errorCode(error) === 'ENOTFOUND') {
      throw new Problem(`HOST=${host} is no address of this machine.`);
    }
    throw error;
  } finally {
    server.close();
  }
}

/**
 * @param {number} firstPort
 * @returns {Promise<number>} the first free port on 127.0.0.1 from there on
 */
export async function findFreePort(firstPort = FIRST_DATABASE_PORT) {
  for (let port = firstPort; port < firstPort + PORTS_TO_TRY; port += 1) {
    if (await isPortFree(port)) return port;
  }
  throw new Problem(`No free port between ${firstPort} and ${firstPort + PORTS_TO_TRY - 1}.`);
}

/**
 * @param {number} port
 * @returns {string} the program that listens there, such as `node, process 123`; empty when unknown
 */
export function describeListener(port) {
  const inodes = ['/proc/net/tcp', '/proc/net/tcp6'].flatMap((table) =>
    listeningInodes(table, port),
  );
  for (const pid of inodes.length === 0 ? [] : processIds()) {
    if (socketInodes(pid).some((inode) => inodes.includes(inode))) {
      return `${readOrEmpty(`/proc/${pid}/comm`).trim()}, process ${pid}`;
    }
  }
  return '';
}

/**
 * @param {string} table of the kernel, with hexadecimal ports and state 0A for listening
 * @param {number} port
 * @returns {string[]}
 */
function listeningInodes(table, port) {
  const wanted = `:${port.toString(16).toUpperCase().padStart(4, '0')}`;
  return readOrEmpty(table)
    .split('\n')
    .map((line) => line.trim().split(/\s+/))
    .filter((columns) => columns[1]?.endsWith(wanted) && columns[3] === '0A')
    .flatMap((columns) => columns[9] ?? []);
}

/** @returns {string[]} */
function processIds() {
  return readdirSync('/proc').filter((name) => /^\d+$/.test(name));
}

/**
 * @param {string} pid
 * @returns {string[]} of the sockets that the process has open; none where that may not be seen
 */
function socketInodes(pid) {
  try {
    return readdirSync(`/proc/${pid}/fd`).flatMap(
      (fd) => /^socket:\[(\d+)\]$/.exec(readLinkOrEmpty(`/proc/${pid}/fd/${fd}`))?.[1] ?? [],
    );
  } catch {
    return [];
  }
}

/**
 * @param {string} path
 * @returns {string}
 */
function readLinkOrEmpty(path) {
  try {
    return readlinkSync(path);
  } catch {
    return '';
  }
}

/**
 * @param {string} path
 * @returns {string}
 */
function readOrEmpty(path) {
  try {
    return readFileSync(path, 'utf8');
  } catch {
    return '';
  }
}
