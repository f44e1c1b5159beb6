import path from 'node:path';

/** Variables of a running Noonmark, which tests must not depend on or reach. */
const FOREIGN_VARIABLES = [
  'DATABASE_URL',
  'DATABASE_OWNER_URL',
  'HOST',
  'PORT',
  'API_PORT',
  'PUBLIC_URL',
  'SESSION_SECRET',
  'NOONMARK_DATA',
  'WEB_DIST',
  'WEB_OUT_DIR',
  'LOG_LEVEL',
  'TRUSTED_PROXIES',
  'NODE_ENV',
];

/**
 * @param {NodeJS.ProcessEnv} env
 * @param {string} projectFolder
 * @returns {{ dataFolder: string, environment: NodeJS.ProcessEnv }} NOONMARK_TEST_DATA lets two runs in one project go side by side
 */
export function readTestEnvironment(env, projectFolder) {
  const inherited = Object.entries(env).filter(([name]) => !FOREIGN_VARIABLES.includes(name));
  return {
    dataFolder: path.resolve(projectFolder, env.NOONMARK_TEST_DATA || '.noonmark-test'),
    environment: {
      ...Object.fromEntries(inherited),
      LOG_LEVEL: 'warn',
      CHROMIUM_PATH: env.CHROMIUM_PATH || '/usr/bin/chromium',
    },
  };
}
