/** One run of the published design, with the notebook's column names; see the README beside this file. */
export type PublishedRun = {
  readonly width: number;
  readonly laserpower: number;
  readonly speed: number;
  readonly pulsefrequency: number;
  readonly udiContrast: number;
  readonly contrast1: number;
  readonly percentage: string;
};

/** The rows of plastic-marking-doe16.csv, so that the compiled seed needs no file; a test keeps them equal. */
export const PUBLISHED_RUNS: readonly PublishedRun[] = [
  { width: 0.04, laserpower: 70, speed: 300, pulsefrequency: 10, udiContrast: 52, contrast1: 48927, percentage: '0.238' },
  { width: 0.04, laserpower: 80, speed: 600, pulsefrequency: 20, udiContrast: 46, contrast1: 36826, percentage: '0.179' },
  { width: 0.04, laserpower: 90, speed: 900, pulsefrequency: 30, udiContrast: 45, contrast1: 33007, percentage: '0.199' },
  { width: 0.04, laserpower: 100, speed: 1200, pulsefrequency: 40, udiContrast: 46, contrast1: 22950, percentage: '0.164' },
  { width: 0.06, laserpower: 70, speed: 600, pulsefrequency: 30, udiContrast: 44, contrast1: 27565, percentage: '0.180' },
  { width: 0.06, laserpower: 80, speed: 300, pulsefrequency: 40, udiContrast: 41, contrast1: 23220, percentage: '0.184' },
  { width: 0.06, laserpower: 90, speed: 900, pulsefrequency: 10, udiContrast: 40, contrast1: 4314, percentage: '0.109' },
  { width: 0.06, laserpower: 100, speed: 900, pulsefrequency: 20, udiContrast: 51, contrast1: 48257, percentage: '0.254' },
  { width: 0.08, laserpower: 70, speed: 900, pulsefrequency: 40, udiContrast: 9, contrast1: 0, percentage: '0.000' },
  { width: 0.08, laserpower: 80, speed: 1200, pulsefrequency: 30, udiContrast: 37, contrast1: 917, percentage: '0.035' },
  { width: 0.08, laserpower: 90, speed: 300, pulsefrequency: 20, udiContrast: 52, contrast1: 27813, percentage: '0.209' },
  { width: 0.08, laserpower: 100, speed: 600, pulsefrequency: 10, udiContrast: 48, contrast1: 31018, percentage: '0.244' },
  { width: 0.1, laserpower: 70, speed: 1200, pulsefrequency: 20, udiContrast: 38, contrast1: 804, percentage: '0.049' },
  { width: 0.1, laserpower: 80, speed: 900, pulsefrequency: 10, udiContrast: 43, contrast1: 6388, percentage: '0.105' },
  { width: 0.1, laserpower: 90, speed: 600, pulsefrequency: 30, udiContrast: 28, contrast1: 830, percentage: '0.082' },
  { width: 0.1, laserpower: 100, speed: 300, pulsefrequency: 40, udiContrast: 37, contrast1: 39458, percentage: '0.301' },
];
