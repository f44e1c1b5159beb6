import type { Page } from '../browser.ts';

/** What a map shows, as the address carries it. */
export interface MapView {
  zoom: number;
  latitude: number;
  longitude: number;
}

/** A picture of the map without its controls, and which of its pixels are madder. */
export interface MapPicture {
  width: number;
  height: number;
  /** 1 where a pixel is madder: the hatch, an outline, a cross. */
  isMadder: Uint8Array;
}

/** The map's canvas of a study's page. */
export function mapOf(page: Page) {
  return page.getByLabel(/^Map of the study/).locator('canvas');
}

/** Takes pictures until two in a row are the same: the map has come to rest. */
export async function pictureAtRest(page: Page): Promise<MapPicture> {
  let last = '';
  for (let attempt = 0; attempt < 40; attempt += 1) {
    const next = (await mapOf(page).screenshot()).toString('base64');
    if (next === last) return readPicture(page, next);
    last = next;
    await page.waitForTimeout(700);
  }
  throw new Error('The map does not come to rest.');
}

/** Madder (#A3263B) is told from ink, slate, marigold and paper with the edges of lines counted in. */
async function readPicture(page: Page, base64: string): Promise<MapPicture> {
  const { width, height, madder } = await page.evaluate(async (png) => {
    const image = new Image();
    image.src = `data:image/png;base64,${png}`;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = image.width;
    canvas.height = image.height;
    const context = canvas.getContext('2d');
    if (context === null) throw new Error('no canvas');
    context.drawImage(image, 0, 0);
    const { data } = context.getImageData(0, 0, image.width, image.height);
    const found: number[] = [];
    for (let index = 0; index < data.length; index += 4) {
      const [red = 0, green = 0, blue = 0] = data.subarray(index, index + 3);
      if (red > 130 && green < 120 && blue < 130 && red - green > 60) found.push(index / 4);
    }
    return { width: image.width, height: image.height, madder: found };
  }, base64);
  const isMadder = new Uint8Array(width * height);
  for (const index of madder) isMadder[index] = 1;
  return { width, height, isMadder };
}

type Size = Pick<MapPicture, 'width' | 'height'>;
type Polygons = readonly number[][][][];
type Edge = readonly [fromX: number, fromY: number, toX: number, toY: number];

/** The pixels of a picture that lie in polygons, by the even-odd rule at their middles. */
export function pixelsIn(polygons: Polygons, view: MapView, size: Size): Uint8Array {
  const { width, height } = size;
  const inside = new Uint8Array(width * height);
  for (const rings of polygons) {
    const edges = edgesOf(rings, view, size);
    for (let row = 0; row < height; row += 1) {
      const y = row + 0.5;
      const crossings = edges
        .filter(([, fromY, , toY]) => fromY > y !== toY > y)
        .map(([fromX, fromY, toX, toY]) => fromX + ((y - fromY) / (toY - fromY)) * (toX - fromX))
        .sort((a, b) => a - b);
      for (let pair = 0; pair + 1 < crossings.length; pair += 2) {
        const first = Math.max(0, Math.ceil((crossings[pair] ?? 0) - 0.5));
        const last = Math.min(width - 1, Math.floor((crossings[pair + 1] ?? 0) - 0.5));
        for (let column = first; column <= last; column += 1) inside[row * width + column] = 1;
      }
    }
  }
  return inside;
}

/** The pixels that the edges of polygons run through: all there is of one that is thinner than a pixel. */
export function pixelsAlong(polygons: Polygons, view: MapView, size: Size): Uint8Array {
  const { width, height } = size;
  const along = new Uint8Array(width * height);
  for (const [fromX, fromY, toX, toY] of polygons.flatMap((one) => edgesOf(one, view, size))) {
    const steps = Math.ceil(2 * Math.hypot(toX - fromX, toY - fromY)) + 1;
    for (let step = 0; step <= steps; step += 1) {
      const column = Math.floor(fromX + ((toX - fromX) * step) / steps);
      const row = Math.floor(fromY + ((toY - fromY) * step) / steps);
      if (column >= 0 && column < width && row >= 0 && row < height) {
        along[row * width + column] = 1;
      }
    }
  }
  return along;
}

/**
 * The edges of a polygon in pixels of a picture. The map is drawn in Web Mercator (EPSG:3857) with
 * 512 px for the world at zoom 0.
 */
function edgesOf(rings: readonly number[][][], view: MapView, { width, height }: Size): Edge[] {
  const worldPx = 512 * 2 ** view.zoom;
  const mercatorX = (lng: number) => ((lng + 180) / 360) * worldPx;
  const mercatorY = (lat: number) =>
    (0.5 - Math.log(Math.tan(Math.PI / 4 + (lat * Math.PI) / 360)) / (2 * Math.PI)) * worldPx;
  const left = mercatorX(view.longitude) - width / 2;
  const top = mercatorY(view.latitude) - height / 2;
  return rings.flatMap((ring) => {
    const points = ring.map(([lng = NaN, lat = NaN]): [number, number] => [
      mercatorX(lng) - left,
      mercatorY(lat) - top,
    ]);
    return points.slice(1).map(([toX, toY], index): Edge => {
      const [fromX, fromY] = points[index] ?? [toX, toY];
      return [fromX, fromY, toX, toY];
    });
  });
}

/** The same pixels and all those within some pixels of them. */
export function widen(pixels: Uint8Array, width: number, byPx: number): Uint8Array {
  const height = pixels.length / width;
  const wide = new Uint8Array(pixels.length);
  pixels.forEach((isIn, index) => {
    if (isIn === 0) return;
    const [row, column] = [Math.floor(index / width), index % width];
    for (let y = Math.max(0, row - byPx); y <= Math.min(height - 1, row + byPx); y += 1) {
      const from = Math.max(0, column - byPx);
      const to = Math.min(width - 1, column + byPx);
      wide.fill(1, y * width + from, y * width + to + 1);
    }
  });
  return wide;
}
