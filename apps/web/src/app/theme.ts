import { createSystem, defaultBaseConfig, defineConfig } from '@chakra-ui/react';
import { NUMBERS_CLASS, NUMBERS_STYLE } from '../components/numbers-panel/numbers-style';
import { semanticColours, semanticShadows, tokens } from './theme-tokens';

const config = defineConfig({
  cssVarsPrefix: 'pp',
  preflight: true,
  theme: {
    // 600: tables become cards; 1024: the bottom bar becomes a rail.
    breakpoints: { sm: '600px', md: '820px', lg: '1024px', xl: '1280px' },
    tokens,
    semanticTokens: { colors: semanticColours, shadows: semanticShadows },
    keyframes: {
      pulse: { '50%': { opacity: '0.5' } },
      slide: { from: { transform: 'translateX(-100%)' }, to: { transform: 'translateX(400%)' } },
    },
  },
  globalCss: {
    html: {
      fontFamily: 'body',
      fontSize: '16px',
      lineHeight: 'md',
      colorPalette: 'brand',
      color: 'fg',
      bg: 'bg',
      textSizeAdjust: '100%',
      // Sticky bars at the bottom must not hide what has the focus.
      scrollPadding: { base: '16px 0 160px', lg: '16px 0' },
    },
    body: { fontSize: 'md', fontVariantNumeric: 'tabular-nums lining-nums', minHeight: '100dvh' },
    '*, *::before, *::after': { borderColor: 'border' },
    [`.${NUMBERS_CLASS}`]: NUMBERS_STYLE,
    'h1, h2, h3': { fontWeight: 'semibold' },
    h1: { fontSize: '3xl', lineHeight: 'title', letterSpacing: 'title' },
    h2: { fontSize: 'xl', lineHeight: 'xl' },
    h3: { fontSize: 'md', lineHeight: 'md' },
    'b, strong': { fontWeight: 'semibold' },
    'a[href]': { textUnderlineOffset: '3px', textDecorationThickness: '1px' },
    ':where(a, button, input, select, textarea, [tabindex]):focus-visible': {
      outline: '2px solid',
      outlineColor: 'brand.focusRing',
      outlineOffset: '2px',
    },
    ':root': {
      _motionReduce: {
        '& *, & *::before, & *::after': {
          animationDuration: '1ms !important',
          animationIterationCount: '1 !important',
          transitionDuration: '1ms !important',
        },
      },
    },
  },
});

export const system = createSystem(defaultBaseConfig, config);
