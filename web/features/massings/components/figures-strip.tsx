import type { MassingFigures } from '../../../../shared/massing/massing-figures.ts';
import { TitleStrip } from '../../../components/title-strip.tsx';
import { useFormats } from '../../../lib/place-context.ts';

/** What a massing amounts to. */
export function FiguresStrip({ figures }: { figures: MassingFigures }) {
  const formats = useFormats();
  const orUnknown = (value: number | null, write: (value: number) => string) =>
    value === null ? 'not known' : write(value);
  return (
    <TitleStrip
      entries={[
        { label: 'Height', value: orUnknown(figures.heightM, (value) => formats.length(value)) },
        { label: 'Storeys', value: orUnknown(figures.storeys, String) },
        { label: 'Footprint', value: orUnknown(figures.footprintM2, formats.area) },
        { label: 'Volume', value: orUnknown(figures.volumeM3, formats.volume) },
        { label: 'Proposed blocks', value: figures.proposedBlocks },
        { label: 'Existing blocks', value: figures.existingBlocks },
      ]}
    />
  );
}
