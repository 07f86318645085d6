import type { Xyz } from './colour';

/** What the white of a colour is called where it is stored or shown. */
export const COLOUR_WHITE_NAME = 'D65, 2° observer';

/**
 * The one white that this product's L*a*b* values refer to: D65, 2° observer, from the chromaticity (0.3127, 0.3290) that
 * IEC 61966-2-1 gives sRGB. A picture in sRGB needs no adaptation to it, and its greys come out as a* = b* = 0.
 */
export const COLOUR_WHITE: Xyz = { x: 3127 / 3290, y: 1, z: 3583 / 3290 };
