import { GENERAL_CAUTIONS } from './general-cautions';
import { METAL_CAUTIONS } from './metal-cautions';
import { NEVER_CAUTIONS } from './never-cautions';
import { OTHER_MATERIAL_CAUTIONS } from './other-material-cautions';
import type { ShippedCaution } from './shipped-caution';

/** The cautions that every shop starts with; a shop may add to them and tighten them, never loosen them. */
export const SHIPPED_CAUTIONS: readonly ShippedCaution[] = [
  ...NEVER_CAUTIONS,
  ...METAL_CAUTIONS,
  ...OTHER_MATERIAL_CAUTIONS,
  ...GENERAL_CAUTIONS,
];
