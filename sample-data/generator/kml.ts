import { textBytes } from './geojson.ts';
import type { Block } from './massing.ts';
import { toClosedRing } from './plane.ts';
import type { Ring } from './shape.ts';

const escaped = (text: string): string =>
  text.replace(/[<>&]/g, (sign) => ({ '<': '&lt;', '>': '&gt;' })[sign] ?? '&amp;');

const ringXml = (ring: Ring, topM: number): string => {
  const coordinates = toClosedRing(ring)
    .map((lngLat) => [...lngLat, topM].join(','))
    .join(' ');
  return `<LinearRing><coordinates>${coordinates}</coordinates></LinearRing>`;
};

const dataXml = (name: string, value: string | number): string =>
  `<Data name="${name}"><value>${escaped(String(value))}</value></Data>`;

/** One extruded polygon: KML draws it from the ground up, so a tower goes through the podium under it. */
function placemarkXml({ id, name, role, topM, storeys, shape }: Block): string {
  const holes = shape.holes
    .map((hole) => `<innerBoundaryIs>${ringXml(hole, topM)}</innerBoundaryIs>`)
    .join('');
  return `    <Placemark id="${escaped(id)}">
      <name>${escaped(name)}</name>
      <ExtendedData>${dataXml('role', role)}${dataXml('storeys', storeys)}</ExtendedData>
      <Polygon>
        <extrude>1</extrude>
        <altitudeMode>relativeToGround</altitudeMode>
        <outerBoundaryIs>${ringXml(shape.outer, topM)}</outerBoundaryIs>${holes}
      </Polygon>
    </Placemark>`;
}

/** A massing as KML 2.2 (OGC 07-147r2). */
export const kmlBytes = (title: string, blocks: readonly Block[]): Uint8Array =>
  textBytes(`<?xml version="1.0" encoding="UTF-8"?>
<kml xmlns="http://www.opengis.net/kml/2.2">
  <Document>
    <name>${escaped(title)}</name>
${blocks.map(placemarkXml).join('\n')}
  </Document>
</kml>
`);
