/** Red, green and blue, each 0 to 255 as an 8-bit picture holds them; fractions are means over pixels. */
export type Srgb = { readonly red: number; readonly green: number; readonly blue: number };

/** Red, green and blue in linear light, each 0 to 1. */
export type LinearRgb = { readonly red: number; readonly green: number; readonly blue: number };

/** CIE 1931 tristimulus values, 2° observer, scaled to Y = 1 for white. */
export type Xyz = { readonly x: number; readonly y: number; readonly z: number };

/** CIE 1976 L*a*b*. It means nothing without its white: here COLOUR_WHITE, unless said. */
export type Lab = { readonly lightness: number; readonly a: number; readonly b: number };
