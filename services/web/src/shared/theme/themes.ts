import {
  createDarkTheme,
  createLightTheme,
  type BrandVariants,
  type Theme,
} from '@fluentui/react-components';

/** A deep well-water teal: none of the colours that mean sun, heat, power or loss. */
const ramp: BrandVariants = {
  10: '#02171b',
  20: '#06282f',
  30: '#0a3740',
  40: '#0d4450',
  50: '#105160',
  60: '#135e6d',
  70: '#166b7a',
  80: '#187888',
  90: '#368a98',
  100: '#529ca8',
  110: '#6daeb8',
  120: '#88c0c8',
  130: '#a2d0d7',
  140: '#bcdfe4',
  150: '#d5edf0',
  160: '#ecf8fa',
};

const type = {
  fontFamilyBase: "Lato, 'Segoe UI', system-ui, sans-serif",
  fontFamilyNumeric: "Lato, 'Segoe UI', system-ui, sans-serif",
} as const satisfies Partial<Theme>;

export const lightTheme: Theme = {
  ...createLightTheme(ramp),
  ...type,
  colorNeutralBackground2: '#f5f7f7',
  colorNeutralBackground3: '#ecf0f0',
};

export const darkTheme: Theme = {
  ...createDarkTheme(ramp),
  ...type,
  // The ramp's middle is too dark for text and links on a dark ground.
  colorBrandForeground1: ramp[120],
  colorBrandForeground2: ramp[130],
  colorBrandForegroundLink: ramp[120],
  colorBrandForegroundLinkHover: ramp[130],
  colorBrandForegroundLinkPressed: ramp[110],
  colorCompoundBrandForeground1: ramp[120],
  colorCompoundBrandStroke: ramp[110],
  colorNeutralBackground1: '#1b2224',
  colorNeutralBackground2: '#121819',
  colorNeutralBackground3: '#232c2e',
};
