import { isDeepStrictEqual } from 'node:util';
import type { Panel, PhysicalProfile } from '@proofplate/recipe-model';

export type ProfileParts = { readonly physical: PhysicalProfile; readonly panel: Panel };
export type ProfileNumbers = { readonly number: number; readonly physicalNumber: number };

/**
 * The numbers of the next profile. Evidence holds within one physical number, so it rises only when the physical part changed.
 *
 * @returns undefined when nothing changed and no new profile is needed
 */
export function nextProfileNumbers(current: ProfileParts & ProfileNumbers, next: ProfileParts): ProfileNumbers | undefined {
  const isPhysicalSame = isDeepStrictEqual(asStored(current.physical), asStored(next.physical));
  const isPanelSame = isDeepStrictEqual(asStored(current.panel), asStored(next.panel));
  if (isPhysicalSame && isPanelSame) return undefined;
  return { number: current.number + 1, physicalNumber: isPhysicalSame ? current.physicalNumber : current.physicalNumber + 1 };
}

/**
 * A part as the database keeps it: plain objects, members that are absent or null left out. The one null that means something, the
 * pulse width of a source with a fixed width, stands inside a list.
 */
export function asStored<Part extends object>(part: Part): Part {
  const withoutNulls = Object.fromEntries(Object.entries(part).filter(([, value]) => value !== null && value !== undefined));
  const plain: unknown = JSON.parse(JSON.stringify(withoutNulls));
  // only absent members were left out
  return plain as Part;
}

/** A panel as stored, each field without its absent members. */
export const panelAsStored = (panel: Panel): Panel => ({ fields: panel.fields.map(asStored) });
