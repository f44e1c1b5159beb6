import type { CaseSummary } from '../../../shared/contracts/cases.ts';
import type { Formats } from '../../lib/formats.ts';

/** `14 storeys, 44.0 m`; what is not known is left out. */
export function describeProposal(
  { storeys, heightM }: Pick<CaseSummary, 'storeys' | 'heightM'>,
  formats: Formats,
): string {
  const parts = [
    storeys === null ? null : `${storeys} ${storeys === 1 ? 'storey' : 'storeys'}`,
    heightM === null ? null : `${formats.length(heightM)} high`,
  ].filter((part) => part !== null);
  return parts.length === 0 ? 'No massing yet' : parts.join(', ');
}
