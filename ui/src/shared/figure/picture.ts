const PICTURE_SCALE = 2; // pixels per px: sharp in print at the usual sizes

const styled = [
  'fill',
  'fill-opacity',
  'stroke',
  'stroke-width',
  'stroke-dasharray',
  'stroke-opacity',
  'opacity',
  'font',
  'text-anchor',
  'color',
];

/** The first drawing inside an element as a file; styles from the sheet are written into it. */
export async function pictureOf(body: HTMLElement | null, kind: 'png' | 'svg'): Promise<Blob> {
  const drawing = body?.querySelector<SVGSVGElement>('svg[role="img"]');
  if (!drawing) throw new Error('This figure holds no drawing; save its data instead.');
  const text = standalone(drawing);
  return kind === 'svg'
    ? new Blob([text], { type: 'image/svg+xml' })
    : rasterise(text, drawing.clientWidth, drawing.clientHeight);
}

function standalone(drawing: SVGSVGElement): string {
  const copy = drawing.cloneNode(true) as SVGSVGElement;
  const from = [drawing, ...drawing.querySelectorAll<SVGElement>('*')];
  const to = [copy, ...copy.querySelectorAll<SVGElement>('*')];
  from.forEach((element, at) => {
    const style = getComputedStyle(element);
    styled.forEach((name) => to[at]!.style.setProperty(name, style.getPropertyValue(name)));
    to[at]!.removeAttribute('class');
  });
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  copy.style.background = getComputedStyle(
    document.querySelector('.sl-root') ?? document.body,
  ).backgroundColor;
  return new XMLSerializer().serializeToString(copy);
}

/** Paints an SVG text on a canvas. */
export async function rasterise(svg: string, widthPx: number, heightPx: number): Promise<Blob> {
  const address = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = address;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = widthPx * PICTURE_SCALE;
    canvas.height = heightPx * PICTURE_SCALE;
    canvas.getContext('2d')!.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await blobOf(canvas);
  } finally {
    URL.revokeObjectURL(address);
  }
}

const blobOf = (canvas: HTMLCanvasElement) =>
  new Promise<Blob>((resolve, reject) =>
    canvas.toBlob(
      (blob) => (blob ? resolve(blob) : reject(new Error('The browser made no picture.'))),
      'image/png',
    ),
  );
