import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { MassingDetail } from '../../../shared/contracts/massings.ts';

/** One thing that an application has to bring. */
export interface CompletenessItem {
  what: string;
  isThere: boolean;
  /** What was found, or what is missing, as a sentence. */
  note: string;
}

const counted = (count: number, one: string, many: string) =>
  count === 0 ? `no ${one}` : `${count} ${count === 1 ? one : many}`;

/** What a planner checks before an application is declared complete, as far as the file can tell. */
export function listCompleteness(
  reviewCase: Pick<CaseDetail, 'siteParcels' | 'description'>,
  massing: Pick<MassingDetail, 'revision' | 'fileName' | 'issues' | 'figures'> | null,
): CompletenessItem[] {
  const { siteParcels, description } = reviewCase;
  const items: CompletenessItem[] = [
    {
      what: 'Site',
      isThere: siteParcels.length > 0,
      note:
        siteParcels.length === 0
          ? 'No parcel is picked.'
          : `${counted(siteParcels.length, 'parcel', 'parcels')}: ${siteParcels.map(({ number }) => number).join(', ')}.`,
    },
    {
      what: 'Description',
      isThere: description.trim() !== '',
      note:
        description.trim() === '' ? 'The project is not described.' : 'The project is described.',
    },
  ];
  if (massing === null) {
    return [...items, { what: 'Massing', isThere: false, note: 'No massing was sent.' }];
  }
  const count = (severity: string) =>
    massing.issues.filter((issue) => issue.severity === severity).length;
  const [errors, warnings] = [count('error'), count('warning')];
  const { heightM, storeys, proposedBlocks, existingBlocks } = massing.figures;
  return [
    ...items,
    {
      what: 'Massing',
      isThere: true,
      note: `Revision ${massing.revision}, ${massing.fileName}: ${counted(proposedBlocks, 'proposed block', 'proposed blocks')}, ${counted(existingBlocks, 'block that stands today', 'blocks that stand today')}.`,
    },
    {
      what: 'Massing sound',
      isThere: errors === 0,
      note:
        errors > 0
          ? `${counted(errors, 'thing', 'things')} in the file must be corrected.`
          : warnings > 0
            ? `Nothing to correct; ${counted(warnings, 'remark', 'remarks')} to read below.`
            : 'Read without an error.',
    },
    {
      what: 'Heights',
      isThere: heightM !== null,
      note:
        heightM === null
          ? 'The height of the proposal is not known.'
          : 'Every block has its height.',
    },
    {
      what: 'Storeys',
      isThere: storeys !== null,
      note: storeys === null ? 'The number of storeys is not stated.' : `${storeys} stated.`,
    },
  ];
}
