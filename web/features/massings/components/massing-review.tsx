import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import type { MassingFigures } from '../../../../shared/massing/massing-figures.ts';
import type { MassingIssue } from '../../../../shared/massing/massing-issue.ts';
import type { DrawnBlock } from '../drawn-block.ts';
import { BlockTable } from './block-table.tsx';
import { FiguresStrip } from './figures-strip.tsx';
import { IssueTable } from './issue-table.tsx';
import { MassingDrawings } from './massing-drawings.tsx';
import { ShadowPreview } from './shadow-preview.tsx';

export interface MassingReviewProps {
  blocks: readonly DrawnBlock[];
  issues: readonly MassingIssue[];
  figures: MassingFigures | null;
  site: Polygonal | null;
}

/** How a massing was understood: remarks, figures, drawings, shadows. */
export function MassingReview({ blocks, issues, figures, site }: MassingReviewProps) {
  return (
    <div className="grid gap-6">
      <IssueTable issues={issues} />
      {figures === null ? null : <FiguresStrip figures={figures} />}
      {blocks.length === 0 ? null : (
        <>
          <MassingDrawings blocks={blocks} site={site} />
          <BlockTable blocks={blocks} />
          <section className="grid gap-3" aria-label="Shadow preview">
            <h3>Where its shadow falls</h3>
            <ShadowPreview blocks={blocks} site={site} />
          </section>
        </>
      )}
    </div>
  );
}
