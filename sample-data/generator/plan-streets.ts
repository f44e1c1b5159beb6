import { offsetPath, smooth, stripOf, type Path } from './path.ts';
import { shapeOf, type Shape } from './shape.ts';

export interface Street {
  name: string;
  /** From property line to property line, in metres. */
  widthM: number;
  /** House numbers grow along it. */
  centreLine: Path;
  /** The ground between its property lines. */
  strip: Shape;
}

const STEPS = 4;

function street(name: string, widthM: number, points: Path): Street {
  const centreLine = points.length > 2 ? smooth(points, STEPS) : points;
  return { name, widthM, centreLine, strip: stripOf(centreLine, widthM / 2) };
}

/** One road under several names: `until` is the point, by its place in the list, where a name ends. */
function roadOfStreets(
  names: readonly { name: string; until: number }[],
  widthM: number,
  points: Path,
): Street[] {
  const line = smooth(points, STEPS);
  const left = offsetPath(line, widthM / 2);
  const right = offsetPath(line, -widthM / 2);
  return names.map(({ name, until }, index) => {
    const range = [(names[index - 1]?.until ?? 0) * STEPS, until * STEPS + 1] as const;
    return {
      name,
      widthM,
      centreLine: line.slice(...range),
      strip: shapeOf([...right.slice(...range), ...[...left.slice(...range)].reverse()]),
    };
  });
}

/** The streets of Larkhaven, drawn by hand; the first ones take the ground at a crossing. */
export const streets: readonly Street[] = [
  street('Candlegate Street', 20, [
    [9, -231],
    [-5, -174.5],
    [-27, -90],
    [-48, -8],
    [-58, 60],
    [-63, 150],
    [-62, 240],
    [-56, 330],
    [-44, 450],
  ]),
  ...roadOfStreets(
    [
      { name: 'Wickmoor Road', until: 5 },
      { name: 'Saltpan Quay', until: 10 },
      { name: 'Oarlock Shore', until: 23 },
    ],
    16,
    [
      [-520, -232],
      [-470, -227],
      [-400, -219],
      [-330, -226],
      [-275, -238],
      [-230, -235],
      [-180, -221],
      [-135.5, -208],
      [-50, -186],
      [30, -165.3],
      [112.5, -144],
      [150, -131],
      [186, -107],
      [218, -72],
      [244, -28],
      [263, 22],
      [272, 72],
      [281, 126],
      [298, 186],
      [318, 242],
      [332, 292],
      [354, 342],
      [390, 400],
      [425, 450],
    ],
  ),
  ...roadOfStreets(
    [
      { name: 'Ropelight Street', until: 3 },
      { name: 'Tallowreed Row', until: 14 },
    ],
    15,
    [
      [-188, -132.8],
      [-157, -124.8],
      [-90, -107.5],
      [-27, -91.2],
      [30, -76.5],
      [88, -61.5],
      [120, -50],
      [148, -30],
      [168, -2],
      [182, 38],
      [191, 84],
      [201, 140],
      [216, 198],
      [236, 256],
      [252, 318],
    ],
  ),
  street('Brinewell Street', 15, [
    [-520, -48],
    [-450, -52],
    [-372, -60],
    [-290, -68],
    [-240, -59],
    [-178, -43.5],
    [-60, -13],
    [64, 19],
    [90, 32],
    [107, 56],
    [115, 99],
  ]),
  street('Gullfeather Street', 14, [
    [115, 99],
    [124, 150],
    [137, 208],
    [156, 266],
    [170, 324],
  ]),
  street('Netloft Street', 15, [
    [-520, 122],
    [-450, 118],
    [-388, 112],
    [-318, 98],
    [-262, 72],
    [-222, 61],
    [-146, 67],
    [-58, 79],
    [60, 92],
    [115, 99],
    [194, 106],
    [277, 102],
    [340, 101],
  ]),
  street('Kelpstone Street', 14, [
    [-237, 148.3],
    [-150, 155],
    [-63, 163],
    [20, 171],
    [128, 177],
    [210, 176],
    [294, 178],
  ]),
  street('Thrumhill Street', 14, [
    [-262, 229.3],
    [-156, 237],
    [-62, 243],
    [54, 251],
    [152, 254],
    [234, 251],
    [319, 250],
  ]),
  street('Larkwicket Street', 14, [
    [-288, 309.3],
    [-162, 317],
    [-57, 323],
    [66, 326],
    [170, 324],
    [252, 318],
    [344, 320],
    [404, 321],
  ]),
  street('Osierbend Lane', 13, [
    [-158, -282],
    [-174, -214],
    [-190, -133],
    [-205, -50],
    [-215, 10],
    [-222, 61],
    [-241, 148],
    [-266, 229],
    [-292, 309],
    [-318, 372],
    [-322, 450],
  ]),
  street('Smeltgate Street', 14, [
    [-85, -192],
    [-107.5, -112],
    [-130, -28],
  ]),
  street('Lanternyard Street', 15, [
    [74, -150],
    [53.5, -70.5],
    [31, 16],
  ]),
  street('Ferrylamp Street', 14, [
    [160, -125],
    [139, -85],
    [119, -50.5],
    [86, 29],
    [62, 92],
    [54, 170],
    [56, 250],
    [66, 326],
  ]),
  street('Quillmarsh Street', 14, [
    [-146, 67],
    [-150, 155],
    [-156, 237],
    [-162, 317],
  ]),
  street('Bellbuoy Lane', 12, [
    [252, -9],
    [171, 5],
  ]),
  street('Marlgate Street', 14, [
    [-352, -223],
    [-362, -140],
    [-372, -60],
    [-380, 26],
    [-388, 112],
  ]),
  street('Hempwright Street', 14, [
    [-520, -139],
    [-450, -138],
    [-362, -142],
    [-270, -150],
    [-231, -144],
    [-188, -132.8],
  ]),
  street('Hollowreed Street', 14, [
    [-520, 36],
    [-450, 33],
    [-376, 26],
  ]),
  street('Wharfslip Lane', 9, [
    [113, -140],
    [133, -220],
  ]),
  street('Sedgeslip Lane', 8, [
    [214, -77],
    [252, -116],
  ]),
];
