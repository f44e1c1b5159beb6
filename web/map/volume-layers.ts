import type { FillExtrusionLayerSpecification, LayerSpecification } from 'maplibre-gl';
import { mapPalette as colour } from './map-palette.ts';

const paint = (fill: string): NonNullable<FillExtrusionLayerSpecification['paint']> => ({
  'fill-extrusion-color': fill,
  'fill-extrusion-base': ['get', 'baseM'],
  'fill-extrusion-height': ['get', 'topM'],
  'fill-extrusion-vertical-gradient': false,
});

/** What stands in the tilted view: the study's own blocks, so that nothing else seems to cast shadows. */
export const volumeLayers: LayerSpecification[] = [
  {
    id: 'surroundings-volume',
    type: 'fill-extrusion',
    source: 'surroundings',
    paint: paint(colour.building),
  },
  {
    id: 'existing-volume',
    type: 'fill-extrusion',
    source: 'blocks',
    filter: ['==', ['get', 'role'], 'existing'],
    paint: paint(colour.building),
  },
  {
    id: 'proposal-volume',
    type: 'fill-extrusion',
    source: 'blocks',
    filter: ['==', ['get', 'role'], 'proposed'],
    paint: paint(colour.proposalVolume),
  },
];

/** Which volumes are shown: none in a plan, and never what does not stand in the state shown. */
export function volumeVisibility(isTilted: boolean, isBefore: boolean): Record<string, boolean> {
  return {
    'surroundings-volume': isTilted,
    'existing-volume': isTilted && isBefore,
    'proposal-volume': isTilted && !isBefore,
  };
}
