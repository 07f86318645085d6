import type { Criterion } from '../vocabulary/criteria';
import { EFFECT_KEYS, EFFECT_LABELS, type EffectKey } from '../vocabulary/lists';
import { QUANTITIES } from '../vocabulary/measurements';

type Limit = Omit<Criterion, 'unit'>;
export type ShippedEffect = { readonly key: EffectKey; readonly name: string; readonly criteria: Criterion[]; readonly notes: string };

const NO_SOURCE = 'Common practice, no source: starting values to be set to what the part needs before the first inspection.';
const EVEN: Limit = { quantity: 'evenness', comparison: 'at least', value: 85 };
const WIPES: Limit = { quantity: 'wipe-test', comparison: 'at least', value: 20 };

const LIMITS: Readonly<Record<EffectKey, readonly Limit[]>> = {
  'dark-anneal': [
    { quantity: 'lightness', comparison: 'at most', value: 35 },
    { quantity: 'contrast', comparison: 'at least', value: 0.5 },
    EVEN,
    WIPES,
  ],
  'colour-anneal': [{ quantity: 'delta-e-2000', comparison: 'at most', value: 5 }, EVEN, WIPES],
  'shallow-engrave': [{ quantity: 'depth', comparison: 'between', value: 5, upper: 50 }, EVEN],
  'deep-engrave': [
    { quantity: 'depth', comparison: 'between', value: 100, upper: 300 },
    { quantity: 'roughness-ra', comparison: 'at most', value: 6.3 },
  ],
  'dye-bleaching': [
    { quantity: 'lightness', comparison: 'at least', value: 70 },
    { quantity: 'contrast', comparison: 'at least', value: 0.5 },
    EVEN,
    WIPES,
  ],
  'coating-removal': [
    { quantity: 'contrast', comparison: 'at least', value: 0.5 },
    EVEN,
    { quantity: 'tape-class', comparison: 'at most', value: 1 },
  ],
  'dark-mark': [{ quantity: 'contrast', comparison: 'at least', value: 0.4 }, EVEN, WIPES],
  'white-mark': [{ quantity: 'contrast', comparison: 'at least', value: 0.4 }, EVEN, WIPES],
  foam: [{ quantity: 'contrast', comparison: 'at least', value: 0.3 }, EVEN],
  frost: [{ quantity: 'contrast', comparison: 'at least', value: 0.15 }, EVEN],
  polish: [{ quantity: 'roughness-ra', comparison: 'at most', value: 0.8 }],
  ablate: [{ quantity: 'depth', comparison: 'between', value: 1, upper: 20 }, EVEN],
  'cut-mark': [{ quantity: 'depth', comparison: 'at least', value: 50 }],
};

/** The effects that every shop starts with, in the order of the closed list. */
export const SHIPPED_EFFECTS: readonly ShippedEffect[] = EFFECT_KEYS.map((key) => ({
  key,
  name: EFFECT_LABELS[key],
  criteria: LIMITS[key].map((limit) => ({ ...limit, unit: QUANTITIES[limit.quantity].unit })),
  notes: NO_SOURCE,
}));
