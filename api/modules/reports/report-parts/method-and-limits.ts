import type { Content } from 'pdfmake/interfaces';
import { missingCharacter } from './printable-text.ts';
import { definitions, heading, subheading } from './report-look.ts';
import type { ReportScene } from './report-scene.ts';

/** How the figures came about, what they leave out, and how anyone can check them. */
export function methodAndLimits(scene: ReportScene, hasMissingCharacters: boolean): Content[] {
  const { payload, time, figures } = scene;
  const { study, municipality } = payload;
  return [
    heading('Method, limits and cautions'),
    {
      text: 'This is a planning-level study on the massing as submitted. It is no survey and no legal opinion: the local code and licensed professionals decide.',
      style: 'strong',
      margin: [0, 0, 0, 6],
    },
    subheading('How it was computed'),
    ...points([
      `Place: ${municipality.name}, ${degrees(municipality.latitude)} latitude, ${degrees(municipality.longitude)} longitude, ${figures.whole(municipality.elevationM)} m above the sea; clock of the zone ${municipality.timeZone}.`,
      'The sun: its direction at each instant, azimuth clockwise from true north, altitude with standard refraction. The sun counts as a point in the middle of its disc.',
      'The ground: a flat plane in metres around the place (transverse Mercator on WGS 84), y to true north.',
      'The shadows: every building and every block of the massing is a vertical prism. Its shadow on a level plane is cast exactly, not sampled; the union of all shadows is taken before and after the proposal. Net new shadow is shadow after that was not there before.',
      'The receptors: the area of each in sun is computed at every judged instant; between two instants it runs straight. Hours are means over the open ground of the receptor.',
      `The energy: direct beam of a clear sky after Ineichen and Perez (2002) with a Linke turbidity of ${figures.decimal(study.linkeTurbidity)}, on the plane of the receptor.`,
      'The loss index: of all receptors that lose anything under a clause, the share of that energy that is lost, from 0 to 100.',
      ...(study.largestDifferenceM2 === null
        ? []
        : [
            `The check: every area was computed in two independent ways; the largest difference was ${sayDifference(study.largestDifferenceM2)}.`,
          ]),
    ]),
    subheading('What it leaves out'),
    ...points([
      'Ground: taken as level. On ground that falls away from the sun shadows are longer, on ground that rises toward it shorter.',
      'Trees and hedges: left out.',
      'Penumbra: not modelled. The edge of a shadow is drawn sharp, though the sun is half a degree wide.',
      'Air: refraction is the standard one at every elevation; the sky is taken as clear all day.',
      'Roofs: every block ends flat at its top. Balconies, chimneys and the like count only where the massing has them.',
      'Heights: those of buildings around are as good as their source; the accuracy of each source stands with the site and the proposal.',
      'Approved projects: those nearby that are not yet built stand in neither state unless the study says so.',
    ]),
    subheading('How to check it'),
    ...points([
      'The evidence file holds everything that went into the study and everything that came out. Anyone can recompute it with one command, without an account; the digest must agree.',
    ]),
    definitions([
      ['Case', payload.caseUrl],
      ['Evidence file', payload.evidenceUrl],
      ['Digest', { text: study.digest, fontSize: 8 }],
      ['Engine', `version ${study.engine}, study finished ${time.dateAndClock(study.finishedAt)}`],
      ['Massing file', { text: `SHA-256 ${payload.revision.sha256}`, fontSize: 8 }],
    ]),
    ...(hasMissingCharacters
      ? [
          {
            text: `The sign ${missingCharacter} stands for a character that this report’s font lacks; the case page shows the text in full.`,
            style: 'small',
          },
        ]
      : []),
  ];
}

/** Lines of the form `Term: sentence`, the term set bold. */
function points(lines: readonly string[]): Content[] {
  return lines.map((line) => {
    const [term = '', ...rest] = line.split(': ');
    return {
      text: rest.length === 0 ? line : [{ text: `${term}: `, style: 'strong' }, rest.join(': ')],
      fontSize: 9,
      margin: [0, 0, 0, 3],
    };
  });
}

function sayDifference(differenceM2: number): string {
  return differenceM2 < 0.001 ? 'less than 0.001 m²' : `${differenceM2.toFixed(3)} m²`;
}

function degrees(value: number): string {
  return `${value.toFixed(4).replace('-', '−')}°`;
}
