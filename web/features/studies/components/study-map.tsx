import { useMemo, useState } from 'react';
import type {
  InstantShadows,
  StudyDetail,
  FindingRow,
} from '../../../../shared/contracts/studies.ts';
import type { TitleBlock } from '../../../../shared/drawing/title-block.ts';
import type { LngLat, Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { usePlace } from '../../../lib/place-context.ts';
import { useCameraInUrl } from '../../../map/camera-in-url.ts';
import type { ShadowLayer } from '../../../map/case-layers.ts';
import type { MapPick } from '../../../map/case-map-props.ts';
import { CaseMap } from '../../../map/case-map.tsx';
import { boundsAround, type Bounds, type MapPin } from '../../../map/map-features.ts';
import { MapTitleBlock } from '../../../map/map-title-block.tsx';
import type { DrawnEvidence } from '../api/get-study-evidence.ts';
import { mapBlocksOf, mapReceptorsOf, mapSurroundingsOf } from '../map-contents.ts';
import { PlaceFacts } from './place-facts.tsx';
import { StudyPlan } from './study-plan.tsx';

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

/** The study on the map: the site, the shadows of the instant, who is judged and who is chosen. */
export function StudyMap(props: StudyMapProps) {
  const { study, site, evidence, rows, shadows, layer, chosen, onChoose, pins } = props;
  const { municipality } = usePlace();
  const { camera, onCameraChange } = useCameraInUrl();
  const [picked, setPicked] = useState<MapPick | null>(null);
  const blocks = useMemo(() => mapBlocksOf(evidence), [evidence]);
  const surroundings = useMemo(() => mapSurroundingsOf(evidence), [evidence]);
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
      surroundings={surroundings}
      canMeasure
      shadows={shadows}
      layer={layer}
      {...(pins === undefined ? {} : { pins })}
      receptors={receptors}
      chosenReceptor={chosen}
      onPick={(pick) => {
        setPicked(pick);
        if (pick.receptor !== null) onChoose(pick.receptor, pick.lngLat);
      }}
      alternative={
        <PlaceFacts
          pick={picked}
          receptors={receptors}
          chosen={chosen}
          onChoose={onChoose}
          onClose={() => setPicked(null)}
        />
      }
      titleBlock={<MapTitleBlock block={titleBlock} />}
      fallback={
        <StudyPlan {...{ site, evidence, rows, shadows, layer, chosen, bounds, titleBlock }} />
      }
      className="h-[26rem] lg:h-[clamp(24rem,100vh-30rem,44rem)]"
    />
  );
}
