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
          <div className="grid items-start gap-x-8 gap-y-6 xl:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
            <MassingDrawings blocks={blocks} site={site} />
            <BlockTable blocks={blocks} />
          </div>
          <section className="grid max-w-5xl gap-3" aria-label="Shadow preview">
            <h3>Where its shadow falls</h3>
            {issues.some(({ severity }) => severity === 'error') ? (
              <p>The preview is drawn once nothing is left to correct.</p>
            ) : (
              <ShadowPreview blocks={blocks} site={site} />
            )}
          </section>
        </>
      )}
    </div>
  );
}
