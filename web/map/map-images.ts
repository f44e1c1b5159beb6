import { mapImages } from './case-layers.ts';
import { mapPalette as colour } from './map-palette.ts';

/** Device pixels per CSS pixel at which the images are drawn. */
export const imagePixelRatio = 2;

/** The images that the layers name, drawn on a canvas; no file is fetched. */
export function drawMapImages(): Map<string, ImageData> {
  return new Map([
    [mapImages.hatch, draw(6, 6, drawHatch)],
    [mapImages.cross, draw(14, 14, drawCross)],
    [mapImages.pin, draw(20, 26, drawPin)],
  ]);
}

function draw(
  width: number,
  height: number,
  paint: (context: CanvasRenderingContext2D, width: number, height: number) => void,
): ImageData {
  const canvas = document.createElement('canvas');
  canvas.width = width * imagePixelRatio;
  canvas.height = height * imagePixelRatio;
  const context = canvas.getContext('2d');
  if (context === null) throw new Error('This browser draws on no canvas.');
  context.scale(imagePixelRatio, imagePixelRatio);
  paint(context, width, height);
  return context.getImageData(0, 0, canvas.width, canvas.height);
}

/**
 * A diagonal that meets itself at every edge, so that the tiles join without a seam. Its ground
 * hides the plain shadow below, so that what is new does not look like what is there already.
 */
function drawHatch(context: CanvasRenderingContext2D, width: number, height: number): void {
  context.fillStyle = colour.netNewGround;
  context.fillRect(0, 0, width, height);
  context.strokeStyle = colour.madder;
  context.lineWidth = 1.1;
  context.beginPath();
  for (const shift of [-width, 0, width]) {
    context.moveTo(shift - 2, height + 2);
    context.lineTo(shift + width + 2, -2);
  }
  context.stroke();
}

/** The cross of "not met", with an edge of paper. */
function drawCross(context: CanvasRenderingContext2D, width: number): void {
  const middle = width / 2;
  const arm = middle - 3;
  context.lineCap = 'round';
  for (const [style, lineWidth] of [
    [colour.sheet, 5],
    [colour.madder, 2],
  ] as const) {
    context.strokeStyle = style;
    context.lineWidth = lineWidth;
    context.beginPath();
    context.moveTo(middle - arm, middle - arm);
    context.lineTo(middle + arm, middle + arm);
    context.moveTo(middle + arm, middle - arm);
    context.lineTo(middle - arm, middle + arm);
    context.stroke();
  }
}

/** A pin of paper with an ink outline; its tip is the place. */
function drawPin(context: CanvasRenderingContext2D, width: number, height: number): void {
  const middle = width / 2;
  const radius = middle - 1.5;
  context.fillStyle = colour.sheet;
  context.strokeStyle = colour.ink;
  context.lineWidth = 1.6;
  context.beginPath();
  context.moveTo(middle, height - 1);
  context.lineTo(middle - radius * 0.82, middle + radius * 0.57);
  context.arc(middle, middle, radius, Math.PI * 0.8, Math.PI * 0.2);
  context.closePath();
  context.fill();
  context.stroke();
  context.fillStyle = colour.ink;
  context.beginPath();
  context.arc(middle, middle, 2.6, 0, 2 * Math.PI);
  context.fill();
}
