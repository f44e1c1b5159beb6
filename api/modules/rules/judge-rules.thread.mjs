import { register } from 'tsx/esm/api';

// A thread does not read TypeScript by itself, even where the process does.
register();
await import('./judge-in-thread.ts');
