import type { Lab } from './colour';

export const GROUND_KINDS = [
  'stainless brushed',
  'anodised black',
  'anodised clear',
  'brass turned',
  'titanium satin',
  'powder coat blue',
  'acrylic smoke',
  'slate natural',
] as const;
export type GroundKind = (typeof GROUND_KINDS)[number];

export type Surface = 'brushed' | 'blasted' | 'turned' | 'coated' | 'glossy' | 'riven';

/** How an unmarked plate looks under workshop light. Invented values. */
export type Ground = {
  readonly lab: Lab;
  readonly surface: Surface;
  /** Strength of the surface texture, 1 = as drawn for that surface. */
  readonly texture: number;
  /** Share of the broad reflection of the lamp in the brightness, 0 to 1. */
  readonly sheen: number;
  /** Colour of corner marks, letters and code. */
  readonly markLab: Lab;
  /** Colour of the heat-tinted rim around a hot cell. */
  readonly rimLab: Lab;
  /** How strongly that rim shows, 0 to 1. */
  readonly rim: number;
  /** True where the laser brightens the ground. */
  readonly brightens: boolean;
  readonly bench: 'rubber mat' | 'birch board';
};

const GROUNDS: Readonly<Record<GroundKind, Ground>> = {
  'stainless brushed': ground([75, 0.2, 2.6], 'brushed', 1.5, 0.2, [22, 0.6, 1], { rimLab: [60, 6, 20], rim: 0.85 }),
  'anodised black': ground([21, 0, -1.2], 'blasted', 0.9, 0.16, [79, 0, 2], { brightens: true, rimLab: [33, 0, 1], rim: 0.2 }),
  'anodised clear': ground([78, -0.4, 0.6], 'blasted', 0.55, 0.16, [27, 0.4, 0.6], { rimLab: [62, 0.5, 2], rim: 0.25 }),
  'brass turned': ground([74, 4, 31], 'turned', 1, 0.22, [27, 6, 12], { rimLab: [50, 12, 30], rim: 0.5 }),
  'titanium satin': ground([66, 0.4, 3], 'brushed', 0.9, 0.16, [29, 2, 1], { rimLab: [58, 5, 22], rim: 0.5 }),
  'powder coat blue': ground([30, 3, -26], 'coated', 1, 0.1, [76, 0, 3], { brightens: true, rimLab: [22, 4, -14], rim: 0.45 }),
  'acrylic smoke': ground([42, -2, -2.5], 'glossy', 1, 0.22, [88, -0.5, 0.8], { brightens: true, rimLab: [60, -1, 0], rim: 0.2 }),
  'slate natural': ground([29, -0.8, -3], 'riven', 1, 0.08, [69, 0, 1.2], { brightens: true, rimLab: [38, 0, 1], rim: 0.25 }),
};

export function groundOf(kind: GroundKind): Ground {
  return GROUNDS[kind];
}

function ground(
  lab: Lab,
  surface: Surface,
  texture: number,
  sheen: number,
  markLab: Lab,
  rest: { rimLab: Lab; rim: number; brightens?: boolean },
): Ground {
  const brightens = rest.brightens ?? false;
  // A dark plate lies on a pale board and a pale plate on a dark mat, as one would lay them to see the edge.
  return {
    lab,
    surface,
    texture,
    sheen,
    markLab,
    rimLab: rest.rimLab,
    rim: rest.rim,
    brightens,
    bench: brightens ? 'birch board' : 'rubber mat',
  };
}
