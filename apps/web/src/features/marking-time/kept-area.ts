import type { AreaMm } from '@proofplate/recipe-model';

const keyOf = (revisionId: string) => `proofplate.part-area.${revisionId}`;

/** The area that was typed last for a setting, on this device. */
export function keptArea(revisionId: string): AreaMm | undefined {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(keyOf(revisionId)) ?? 'null');
    return isArea(kept) ? kept : undefined;
  } catch {
    return undefined;
  }
}

export function keepArea(revisionId: string, area: AreaMm): void {
  try {
    localStorage.setItem(keyOf(revisionId), JSON.stringify(area));
  } catch {
    // a browser that keeps nothing asks again
  }
}

function isArea(value: unknown): value is AreaMm {
  if (typeof value !== 'object' || value === null || !('widthMm' in value) || !('heightMm' in value)) return false;
  return [value.widthMm, value.heightMm].every((side) => typeof side === 'number' && side > 0);
}
