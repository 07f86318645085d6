import { resolve } from 'node:path';

/** The folder of package.json. */
export const CHECKOUT = resolve(import.meta.dirname, '../../../..');
