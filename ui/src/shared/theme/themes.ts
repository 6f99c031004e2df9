import { createDarkTheme, createLightTheme, type Theme } from '@fluentui/react-components';
import { colours, slate, type ColourMode, type ColourName } from './tokens';

export type SiltTheme = Theme & Record<ColourName, string>;

const family = "Lato, 'Siltlight Greek', 'Segoe UI', system-ui, sans-serif";

const type = {
  fontFamilyBase: family,
  fontFamilyNumeric: family,
  fontWeightSemibold: 700, // only 400 and 700 are shipped
  fontWeightMedium: 700,
  borderRadiusSmall: '2px',
  borderRadiusMedium: '3px',
  borderRadiusLarge: '4px',
  borderRadiusXLarge: '6px',
} as unknown as Partial<Theme>;

function surfaces(mode: ColourMode): Partial<Theme> {
  const own = colours[mode];
  return {
    colorNeutralBackground1: own.slSheet,
    colorNeutralBackground2: own.slPaper,
    colorNeutralBackground3: own.slSunk,
    colorNeutralForeground1: own.slInk,
    colorNeutralForeground2: own.slInk2,
    colorNeutralForeground3: own.slInk3,
    colorNeutralForeground4: own.slInk3,
    colorNeutralStroke1: own.slRule2,
    colorNeutralStroke2: own.slRule,
    colorCompoundBrandStroke: own.slLoess,
    colorBrandForegroundLink: own.slAccent,
    colorSubtleBackgroundHover: own.slSunk,
  };
}

const light = {
  ...createLightTheme(slate),
  ...type,
  ...colours.light,
  ...surfaces('light'),
  colorNeutralForegroundDisabled: '#767E86',
  colorNeutralStrokeAccessible: '#6E767D',
  colorBrandBackground: slate[60],
  colorBrandBackgroundHover: slate[70],
  colorBrandBackgroundPressed: slate[50],
  colorCompoundBrandBackground: slate[70],
  colorNeutralStencil1: colours.light.slBed,
  colorNeutralStencil2: colours.light.slSunk,
  colorStrokeFocus2: slate[60],
  shadow4: '0 1px 2px rgba(23,33,43,.10)',
  shadow16: '0 6px 18px rgba(23,33,43,.14)',
} as SiltTheme;

const dark = {
  ...createDarkTheme(slate),
  ...type,
  ...colours.dark,
  ...surfaces('dark'),
  colorNeutralStrokeAccessible: '#8796A1',
  colorBrandBackground: slate[140],
  colorBrandBackgroundHover: slate[150],
  colorBrandBackgroundPressed: slate[130],
  colorNeutralForegroundOnBrand: slate[30],
  colorCompoundBrandBackground: slate[130],
  colorNeutralStencil1: colours.dark.slRule,
  colorNeutralStencil2: colours.dark.slSheet,
  colorStrokeFocus2: colours.dark.slInk,
  shadow4: '0 1px 2px rgba(0,0,0,.5)',
  shadow16: '0 6px 18px rgba(0,0,0,.55)',
} as SiltTheme;

export const themes: Record<ColourMode, SiltTheme> = { light, dark };
