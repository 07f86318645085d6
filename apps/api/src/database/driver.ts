import { assertPatchedDriver } from '@proofplate/db';

/** Refuses to start on a driver that can run one transaction's statements inside another. @throws Error that says how to repair it */
export function requirePatchedDriver(): void {
  assertPatchedDriver();
}
