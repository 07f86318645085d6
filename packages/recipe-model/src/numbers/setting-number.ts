import type { DerivedNumber } from '@proofplate/physics';

/** A derived number with everything to look at before it is trusted; an empty list is the usual case. */
export type SettingNumber = DerivedNumber & { readonly lookAt: readonly string[] };
