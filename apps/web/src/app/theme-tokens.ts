// The colours of the plate, the steel and the paper: light and dark value of every semantic token.

/** [light, dark] */
type Pair = readonly [string, string];

const COLOURS = {
  bg: {
    DEFAULT: ['#F6F4EF', '#16181B'],
    subtle: ['#EFECE4', '#1B1E21'],
    muted: ['#E6E2D8', '#2A2E33'],
    panel: ['#FFFFFF', '#1F2226'],
    inverted: ['#1F2328', '#ECE9E2'],
  },
  fg: { DEFAULT: ['#1F2328', '#ECE9E2'], muted: ['#53575C', '#B5B4AF'], subtle: ['#66696C', '#9C9D9C'], inverted: ['#F6F4EF', '#16181B'] },
  // border is a hairline (decoration); border.emphasized bounds a control and keeps 3:1.
  border: { DEFAULT: ['#D9D4C8', '#363A40'], emphasized: ['#857F71', '#7E848C'] },
  brand: {
    solid: ['#2B4C7E', '#A9C3EA'],
    contrast: ['#FFFFFF', '#0F1826'],
    fg: ['#27446F', '#A9C3EA'],
    subtle: ['#E9EEF5', '#212B39'],
    muted: ['#D3DDEB', '#2C3B50'],
    emphasized: ['#8FA6C8', '#54709A'],
    focusRing: ['#2B4C7E', '#A9C3EA'],
  },
  straw: {
    solid: ['#B07A1C', '#E0B25A'],
    contrast: ['#1A1408', '#1A1408'],
    fg: ['#744E0A', '#EAC377'],
    subtle: ['#FBF3E2', '#2A2519'],
    muted: ['#F2E2BF', '#43381F'],
    emphasized: ['#D3AC62', '#7D6630'],
    focusRing: ['#2B4C7E', '#A9C3EA'],
  },
  oxide: {
    solid: ['#A3321F', '#F0937F'],
    contrast: ['#FFFFFF', '#2A0E08'],
    fg: ['#93291A', '#F4A797'],
    subtle: ['#FBECE8', '#32211D'],
    muted: ['#F0CCC3', '#4F2C25'],
    emphasized: ['#C9796A', '#A35F50'],
    focusRing: ['#2B4C7E', '#A9C3EA'],
  },
  plate: {
    metal: ['#D6D3CB', '#AAA79F'],
    edge: ['#8D897F', '#0D0E10'],
    mark: ['#34322F', '#34322F'],
    ring: ['#FFC94A', '#FFC94A'],
    ringLine: ['#14161A', '#14161A'],
    burn: ['#A3321F', '#861E10'],
  },
} as const satisfies Record<string, Record<string, Pair>>;

type SemanticColour = { value: { base: string; _dark: string } };

function bothModes(group: Record<string, Pair>): Record<string, SemanticColour> {
  return Object.fromEntries(Object.entries(group).map(([name, [light, dark]]) => [name, { value: { base: light, _dark: dark } }]));
}

export const semanticColours = Object.fromEntries(Object.entries(COLOURS).map(([name, group]) => [name, bothModes(group)]));

const px = (value: number) => ({ value: `${value}px` });
const rem = (value: number) => ({ value: `${value}rem` });

/** Space keeps an 8-px rhythm with 4 as the half step; a step is 4 px. */
const SPACING_STEPS = [0.5, 1, 1.5, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8, 9, 10, 11, 12, 14, 16, 18, 20, 24] as const;
const spacing = Object.fromEntries(SPACING_STEPS.map((step) => [step, px(step * 4)]));

export const tokens = {
  colors: { transparent: { value: 'transparent' }, current: { value: 'currentColor' } },
  fonts: {
    body: { value: '"Source Sans 3", system-ui, sans-serif' },
    heading: { value: '"Source Sans 3", system-ui, sans-serif' },
    /** Hashes only. */
    mono: { value: 'ui-monospace, "DejaVu Sans Mono", Menlo, Consolas, monospace' },
  },
  fontSizes: {
    sm: rem(0.875),
    md: rem(1),
    lg: rem(1.125),
    xl: rem(1.25),
    '2xl': rem(1.625),
    '3xl': rem(1.75),
    '5xl': rem(2.5),
    numeralMany: rem(3),
    '6xl': rem(3.25),
    '7xl': rem(4),
  },
  lineHeights: { sm: rem(1.25), md: rem(1.5), xl: rem(1.75), title: rem(2.25), '2xl': rem(2.5), '5xl': rem(2.75), none: { value: '1' } },
  fontWeights: { normal: { value: '400' }, semibold: { value: '600' }, bold: { value: '700' } },
  letterSpacings: { tight: { value: '-0.01em' }, title: { value: '-0.005em' } },
  spacing,
  sizes: {
    ...spacing,
    control: px(40),
    touch: px(48),
    act: px(56),
    glove: px(64),
    primaryAct: px(72),
    row: px(36),
    rowTarget: px(44),
    rail: px(208),
    bar: px(64),
    form: px(480),
    prose: { value: '60ch' },
    content: px(1248),
    full: { value: '100%' },
    screen: { value: '100dvh' },
  },
  // A shorthand without a colour would take the text's; this one takes the hairline's until borderColor says otherwise.
  borders: { hairline: { value: '1px solid var(--pp-colors-border)' } },
  radii: { sm: px(2), md: px(4), full: { value: '9999px' } },
  zIndex: {
    sticky: { value: '2' },
    acts: { value: '3' },
    bar: { value: '4' },
    popover: { value: '10' },
    modal: { value: '20' },
    status: { value: '30' },
  },
  durations: { fade: { value: '120ms' } },
};

export const semanticShadows = {
  popover: {
    value: {
      base: '0 8px 24px rgba(31, 35, 40, 0.16), 0 1px 2px rgba(31, 35, 40, 0.12)',
      _dark: '0 8px 24px rgba(0, 0, 0, 0.5), 0 0 0 1px #363A40',
    },
  },
};
