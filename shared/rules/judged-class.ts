import type { ReceptorClass } from './rule-schema.ts';

/** What a clause judges: a class of receptors, or the ring that the engine makes. */
export type JudgedClass = ReceptorClass | 'ring';
