import { randomUUID } from 'node:crypto';

/** Header of a creating or signing call. */
export const newKey = () => ({ 'idempotency-key': randomUUID() });
