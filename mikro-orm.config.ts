import { ormOptions } from './api/orm.ts';

// For the MikroORM command line alone; the servers read their settings in api/env.ts.
export default ormOptions(
  process.env.DATABASE_OWNER_URL ??
    process.env.DATABASE_URL ??
    'postgresql://noonmark@127.0.0.1:5432/noonmark',
);
