import type { KnownFormat } from './massing-format.ts';

/** Types that people are likely to send and that are not read yet, so that the answer can name them. */
export const unreadFormats: KnownFormat[] = [
  { name: 'a ZIP archive (KMZ, zipped Shapefile)', recognises: startsWith([0x50, 0x4b]) },
  { name: 'a gzip archive', recognises: startsWith([0x1f, 0x8b]) },
  { name: 'a Shapefile', recognises: startsWith([0x00, 0x00, 0x27, 0x0a]) },
  { name: 'a GeoPackage', recognises: startsWithText('SQLite format 3\0') },
  { name: 'a PDF document', recognises: startsWithText('%PDF') },
  { name: 'an IFC model', recognises: startsWithText('ISO-10303-21') },
  { name: 'a DWG drawing', recognises: startsWithText('AC10') },
  { name: 'a SketchUp model', recognises: startsWith([0xff, 0xfe, 0xff, 0x0e]) },
  { name: 'a Rhino model', recognises: startsWithText('3D Geometry File Format') },
  { name: 'a DXF drawing', recognises: ({ head }) => /^0\s+SECTION\b/.test(head) },
  { name: 'KML', recognises: ({ head }) => head.startsWith('<') && /<kml[\s>]/i.test(head) },
  { name: 'CityGML', recognises: ({ head }) => head.startsWith('<') && /CityModel/.test(head) },
  { name: 'XML', recognises: ({ head }) => head.startsWith('<') },
  {
    name: 'a table (CSV)',
    recognises: ({ head }) => /^[\w "]+([,;\t][\w "./:-]*){1,}\r?\n/.test(head),
  },
];

function startsWith(start: readonly number[]): KnownFormat['recognises'] {
  return ({ bytes }) => start.every((byte, index) => bytes[index] === byte);
}

function startsWithText(start: string): KnownFormat['recognises'] {
  return startsWith([...new TextEncoder().encode(start)]);
}
