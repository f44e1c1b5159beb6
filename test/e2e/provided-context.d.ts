import 'vitest';

/** What global-setup.ts hands to the browser tests: `inject('baseUrl')` in a test file. */
declare module 'vitest' {
  interface ProvidedContext {
    /** Where the server under test answers. */
    baseUrl: string;
    /** Its database, as the application's role. */
    databaseUrl: string;
    /** The printed result of seeding: the demo accounts with their passwords. */
    demoAccounts: string;
    /** The server's data folder, where it keeps files. */
    dataFolder: string;
  }
}
