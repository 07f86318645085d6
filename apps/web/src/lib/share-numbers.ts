const SHARES = new Set(['pulseOverlap', 'lineOverlap', 'coverageRipple']);

/** True for a computed number that is a share of a whole: it is shown in percent wherever it stands. */
export const isShare = (key: string): boolean => SHARES.has(key);
