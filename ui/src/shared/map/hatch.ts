const TILE_PX = 7;

/** One tile of the hatching: fewer than three sites, or an interval that includes zero. */
export function hatchTile(colour: string): HTMLCanvasElement {
  const canvas = document.createElement('canvas');
  canvas.width = TILE_PX;
  canvas.height = TILE_PX;
  const context = canvas.getContext('2d')!;
  context.strokeStyle = colour;
  context.lineWidth = 0.9;
  for (const offset of [-TILE_PX, 0, TILE_PX]) {
    context.beginPath();
    context.moveTo(offset - 1, TILE_PX + 1);
    context.lineTo(offset + TILE_PX + 1, -1);
    context.stroke();
  }
  return canvas;
}
