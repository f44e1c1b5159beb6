import { useMemo } from 'react';
import type {
  InstantShadows,
  StudyDetail,
  FindingRow,
} from '../../../../shared/contracts/studies.ts';
import { drawPlan, emptyPlan } from '../../../../shared/drawing/plan-drawing.ts';
import { titleBlockRows, type TitleBlock } from '../../../../shared/drawing/title-block.ts';
import type { LngLat, Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { SvgDrawing } from '../../../components/svg-drawing.tsx';
import { usePlace } from '../../../lib/place-context.ts';
import { useCameraInUrl } from '../../../map/camera-in-url.ts';
import type { ShadowLayer } from '../../../map/case-layers.ts';
import { CaseMap } from '../../../map/case-map.tsx';
import { boundsAround, type Bounds, type MapPin } from '../../../map/map-features.ts';
import { MapTitleBlock } from '../../../map/map-title-block.tsx';
import type { DrawnEvidence } from '../api/get-study-evidence.ts';
import { mapBlocksOf, mapReceptorsOf } from '../map-contents.ts';

export interface StudyMapProps {
  study: StudyDetail;
  site: Polygonal | null;
  evidence: DrawnEvidence;
  rows: readonly FindingRow[];
  shadows: InstantShadows | null;
  layer: ShadowLayer;
  chosen: string | null;
  /** A receptor and the place at which the person pointed. */
  onChoose: (receptor: string, lngLat: LngLat) => void;
  pins?: readonly MapPin[];
}

const marginM = 40;
const fallbackWidth = 760;

/** The study on the map: the site, the shadows of the instant, who is judged and who is chosen. */
export function StudyMap(props: StudyMapProps) {
  const { study, site, evidence, rows, shadows, layer, chosen, onChoose, pins } = props;
  const { municipality } = usePlace();
  const { camera, onCameraChange } = useCameraInUrl();
  const blocks = useMemo(() => mapBlocksOf(evidence), [evidence]);
  const receptors = useMemo(() => mapReceptorsOf(evidence, rows), [evidence, rows]);
  const bounds = useMemo<Bounds>(() => {
    const notMet = receptors.filter((one) => one.finding === 'not-met');
    const geometries = [...(site === null ? [] : [site]), ...notMet.map((one) => one.geometry)];
    return boundsAround(geometries, marginM) ?? municipality.extent;
  }, [receptors, site, municipality.extent]);
  const titleBlock: TitleBlock = {
    caseReference: study.caseReference,
    revision: study.revision,
    studyDigest: study.digest,
    at: shadows?.at ?? null,
    azimuthDeg: shadows?.azimuthDeg ?? null,
    altitudeDeg: shadows?.altitudeDeg ?? null,
  };
  return (
    <CaseMap
      label="Map of the study: the site, the shadows of the chosen time, and the receptors"
      bounds={bounds}
      camera={camera}
      onCameraChange={onCameraChange}
      site={site}
      blocks={blocks}
      shadows={shadows}
      layer={layer}
      {...(pins === undefined ? {} : { pins })}
      receptors={receptors}
      chosenReceptor={chosen}
      onPick={({ receptor, lngLat }) => {
        if (receptor !== null) onChoose(receptor, lngLat);
      }}
      titleBlock={<MapTitleBlock block={titleBlock} />}
      fallback={<StudyPlan {...props} bounds={bounds} titleBlock={titleBlock} />}
      className="h-[26rem] lg:h-[clamp(24rem,100vh-30rem,44rem)]"
    />
  );
}

type StudyPlanProps = StudyMapProps & { bounds: Bounds; titleBlock: TitleBlock };

/** The same as a drawing that every browser shows. */
function StudyPlan({ site, evidence, rows, shadows, chosen, bounds, titleBlock }: StudyPlanProps) {
  const { municipality, formats } = usePlace();
  const { longitude, latitude } = municipality;
  const markup = useMemo(() => {
    const receptors = mapReceptorsOf(evidence, rows);
    const footprints = (role: string) =>
      evidence.blocks.features
        .filter(({ properties }) => properties.role === role)
        .map(({ geometry }) => geometry);
    const shadowOf = (kind: string) =>
      shadows?.features.find(({ properties }) => properties.kind === kind)?.geometry;
    const [standing, netNew] = [shadowOf('before'), shadowOf('netNew')];
    return drawPlan(
      {
        ...emptyPlan,
        parcels: receptors.filter((one) => one.class === 'parcel').map((one) => one.geometry),
        buildings: footprints('context'),
        site: site === null ? [] : [site],
        removed: footprints('existing'),
        proposal: mapBlocksOf(evidence).filter(({ role }) => role === 'proposed'),
        shadows: standing === undefined || netNew === undefined ? null : { standing, netNew },
        chosen: receptors.find(({ id }) => id === chosen)?.geometry ?? null,
        notMet: receptors
          .filter(({ finding }) => finding === 'not-met')
          .map(({ geometry }) => ({ geometry, mark: '✕' })),
      },
      {
        origin: { longitude, latitude },
        extent: bounds,
        width: fallbackWidth,
        label: 'Plan of the study: the site, the shadows of the chosen time, and the receptors',
        figures: formats.figure,
        detail: 'sheet',
        titleBlock: titleBlockRows(titleBlock, formats.civil, formats.figure),
      },
    );
  }, [site, evidence, rows, shadows, chosen, bounds, titleBlock, longitude, latitude, formats]);
  return <SvgDrawing markup={markup} />;
}
