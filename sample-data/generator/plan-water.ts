import { smooth, stripOf, type Path } from './path.ts';
import { shapeOf, type Point, type Shape } from './shape.ts';

/** The sheet that the sample covers, in metres: west, south, east, north. */
export const sheet = { west: -500, south: -400, east: 500, north: 430 } as const;

export const sheetShape: Shape = shapeOf([
  [sheet.west, sheet.south],
  [sheet.east, sheet.south],
  [sheet.east, sheet.north],
  [sheet.west, sheet.north],
]);

const naturalShoreWest: Path = [
  [-520, -300],
  [-470, -294],
  [-410, -282],
  [-350, -286],
  [-300, -300],
  [-255, -307],
  [-215, -300],
  [-168, -282],
  [-120, -268],
];

/** The quay wall of the old harbour and the wharf east of it: straight, with one step. */
const quayWall: Path = [
  [-120, -268],
  [14, -233.4],
  [26, -284],
  [35.7, -281.5],
  [23.7, -230.9],
  [128, -204],
  [133, -214],
  [212, -169],
  [207, -160],
];

const naturalShoreEast: Path = [
  [207, -160],
  [238, -130],
  [268, -92],
  [297, -44],
  [318, 10],
  [328, 62],
  [338, 120],
  [356, 176],
  [372, 228],
  [386, 282],
  [410, 330],
  [446, 384],
  [520, 470],
];

/** Land lies to the left of this line. */
const shoreline: Path = [
  ...smooth(naturalShoreWest, 3),
  ...quayWall.slice(1, -1),
  ...smooth(naturalShoreEast, 3),
];

const lakeBeyondSheet: Point[] = [
  [520, -420],
  [-520, -420],
];

export const lake: Shape = shapeOf([...shoreline, ...lakeBeyondSheet]);

const creekLine: Path = [
  [-352, 450],
  [-344, 372],
  [-316, 292],
  [-300, 222],
  [-270, 152],
  [-262, 90],
  [-248, 30],
  [-252, -40],
  [-232, -110],
  [-226, -180],
  [-206, -240],
  [-208, -310],
];

export const creek: Shape = stripOf(smooth(creekLine, 4), 4);

/** The ground that is divided into blocks: the town, without the fields around it. */
export const townGround: Shape = shapeOf([
  [-462, -294],
  ...shoreline.filter(([x]) => x > -462 && x < 408),
  [408, 330],
  [404, 366],
  [352, 360],
  [262, 356],
  [168, 366],
  [20, 370],
  [-140, 360],
  [-338, 349],
  [-310, 240],
  [-278, 140],
  [-330, 143],
  [-392, 156],
  [-456, 162],
]);

/** The lakeside walk along the quay wall, with the pier and the square at the foot of the main street. */
export const promenade: Shape = shapeOf([
  [-160, -279.5],
  ...shoreline.filter(([x]) => x > -159 && x < 127.9),
  [128, -204],
  [124.4, -190.4],
  [38, -212.7],
  [34, -196],
  [-42, -215.6],
  [-38, -232.3],
  [-123.6, -254.4],
  [-156.5, -264.5],
]);
