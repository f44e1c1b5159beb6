import { useMemo } from 'react';
import { drawLedger } from '../../../../shared/drawing/ledger-drawing.ts';
import type { SunLedger } from '../../../../shared/receptors/sun-ledger-schema.ts';
import { SvgDrawing } from '../../../components/svg-drawing.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { useWidth } from '../../../map/use-width.ts';

export interface LedgerPictureProps {
  ledger: SunLedger;
  /** The judged windows: first and last instant. */
  judged: readonly { fromAt: string; toAt: string }[];
}

/** The drawing's letters are made for paper; on a screen they stand this much larger. */
const enlargement = 1.45;
const widestPx = 720;
/** Where there is room, hours stand beside the bands. */
const figuresFromPx = 680;

/** The sun ledger as a picture: for each key date the sun now over the sun with the proposal. */
export function LedgerPicture({ ledger, judged }: LedgerPictureProps) {
  const { civil, figure } = useFormats();
  const [holder, width] = useWidth<HTMLDivElement>();
  const drawnPx = width === null ? null : Math.min(width, widestPx);
  const markup = useMemo(
    () =>
      drawnPx === null
        ? null
        : drawLedger(ledger, {
            width: drawnPx / enlargement,
            time: civil,
            figures: figure,
            judged,
            hasFigures: drawnPx >= figuresFromPx,
          }),
    [ledger, judged, civil, figure, drawnPx],
  );
  return (
    <figure className="grid gap-2" style={{ maxWidth: widestPx }}>
      <div ref={holder} className="min-h-40">
        {markup === null ? null : <SvgDrawing markup={markup} />}
      </div>
      <figcaption className="flex flex-wrap gap-x-5 gap-y-1 text-small">
        <span className="flex items-center gap-1.5">
          <span
            aria-hidden="true"
            className="inline-block h-3 w-4 border border-marigold bg-marigold-fill"
          />
          sun
        </span>
        <span className="flex items-center gap-1.5">
          <span aria-hidden="true" className="hatched inline-block h-3 w-4 border border-madder" />
          lost
        </span>
        <span>upper band: now; lower band: with the proposal</span>
        {judged.length === 0 ? null : <span>grey: the hours that the rule judges</span>}
      </figcaption>
    </figure>
  );
}
