import { rgbOf, seriesColours } from '../src/shared/theme/ramps';
import { themes } from '../src/shared/theme/themes';
import { colours, type ColourMode, type ColourName } from '../src/shared/theme/tokens';

// Relative luminance and contrast ratio as defined by WCAG 2.2, "relative luminance" and "contrast ratio".
const channel = (value: number) => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4);
const luminance = (hex: string) => {
  const [r, g, b] = rgbOf(hex).map((value) => channel(value / 255)) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
};
const contrast = (a: string, b: string) => {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (high + 0.05) / (low + 0.05);
};

const surfaces: ColourName[] = ['slPaper', 'slSheet', 'slSunk', 'slBed', 'slSelect'];
const texts: ColourName[] = [
  'slInk',
  'slInk2',
  'slInk3',
  'slAccent',
  'slLoessText',
  'slRustText',
  'slMossText',
  'slSlate',
];
const onTint: [text: ColourName, tint: ColourName][] = [
  ['slLoessText', 'slLoessTint'],
  ['slRustText', 'slRustTint'],
  ['slMossText', 'slMossTint'],
  ['slSlate', 'slIceTint'],
  ['slInk', 'slRustTint'],
  ['slInk2', 'slRustTint'],
];
const marks: ColourName[] = ['slLoess', 'slRust', 'slMoss', 'slLine'];

describe.each<ColourMode>(['light', 'dark'])('in the %s theme', (mode) => {
  const own = colours[mode];

  test('every text colour reaches 4.5 to 1 on every surface', () => {
    const weak = texts.flatMap((text) =>
      surfaces
        .filter((surface) => contrast(own[text], own[surface]) < 4.5)
        .map((surface) => `${text} on ${surface}`),
    );
    expect(weak).toEqual([]);
  });

  test('words of state tags and errors reach 4.5 to 1 on their tints', () => {
    expect(onTint.filter(([text, tint]) => contrast(own[text], own[tint]) < 4.5)).toEqual([]);
  });

  test('marks and series reach 3 to 1 on paper', () => {
    const drawn = [...marks.map((mark) => own[mark]), ...seriesColours[mode]];
    expect(drawn.filter((colour) => contrast(colour, own.slPaper) < 3)).toEqual([]);
  });

  test('the words of the primary button reach 4.5 to 1 in each of its states', () => {
    const theme = themes[mode];
    const grounds = [
      theme.colorBrandBackground,
      theme.colorBrandBackgroundHover,
      theme.colorBrandBackgroundPressed,
    ];
    const ink =
      theme.colorNeutralForegroundOnBrand === 'white' ? '#FFFFFF' : theme.colorNeutralForegroundOnBrand;
    expect(grounds.filter((ground) => contrast(ink, ground) < 4.5)).toEqual([]);
  });
});

test('black on white is the largest contrast there is', () => {
  expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 6);
});
