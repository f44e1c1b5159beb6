import { Component, lazy, Suspense, useState, type ReactNode } from 'react';
import { Loading } from '../components/loading.tsx';
import { usePrinting } from '../lib/use-printing.ts';
import type { CaseMapProps } from './case-map-props.ts';

const MapCanvas = lazy(() => import('./map-canvas.tsx'));

/** The map of a case. Its drawing code is loaded when the first map is shown. */
export function CaseMap(props: CaseMapProps) {
  const { label, titleBlock, fallback, alternative, className = 'h-[60vh] min-h-80' } = props;
  const [canDraw] = useState(hasWebGl);
  const [isTileMissing, setIsTileMissing] = useState(false);
  // A printer gets nothing of a WebGL canvas: paper shows the plan drawing.
  const isPrinting = usePrinting();
  const notice = (
    <div className="grid gap-3 border border-hairline bg-sheet p-4">
      <p role="status">
        This browser cannot draw the interactive map (it needs WebGL).{' '}
        {fallback === undefined
          ? 'Everything that it would show also stands in words on this page.'
          : 'Here is the plan as a drawing instead; everything also stands in words on this page.'}
      </p>
      {fallback}
    </div>
  );
  if (!canDraw) {
    return (
      <div>
        {notice}
        {alternative}
      </div>
    );
  }
  return (
    <MapBoundary notice={notice}>
      <section aria-label={label} className={fallback === undefined ? 'no-print' : ''}>
        {isPrinting ? <div className="plan-on-paper">{fallback}</div> : null}
        <div className={`no-print relative border border-hairline bg-sheet ${className}`}>
          <Suspense
            fallback={
              <div className="p-3">
                <Loading what="the map" />
              </div>
            }
          >
            <MapCanvas {...props} onTilesMissing={() => setIsTileMissing(true)} />
          </Suspense>
          {titleBlock === undefined ? null : (
            <div className="pointer-events-none absolute end-0 bottom-0 hidden sm:block">
              {titleBlock}
            </div>
          )}
        </div>
        {titleBlock === undefined ? null : (
          <div className="no-print mt-2 sm:hidden">{titleBlock}</div>
        )}
        {isTileMissing ? (
          <p role="status" className="mt-1 text-small">
            A part of the base map could not be loaded. Move the map or reload the page.
          </p>
        ) : null}
        {alternative === undefined ? null : (
          <div className="no-print mt-1 text-small">{alternative}</div>
        )}
      </section>
    </MapBoundary>
  );
}

function hasWebGl(): boolean {
  return document.createElement('canvas').getContext('webgl2') !== null;
}

interface MapBoundaryProps {
  notice: ReactNode;
  children: ReactNode;
}

/** Shows the notice where the drawing code could not be loaded or the graphics driver gave up. */
class MapBoundary extends Component<MapBoundaryProps, { hasFailed: boolean }> {
  override state = { hasFailed: false };

  static getDerivedStateFromError() {
    return { hasFailed: true };
  }

  override render() {
    return this.state.hasFailed ? this.props.notice : this.props.children;
  }
}
