import type { Panel } from '@proofplate/recipe-model';

/** What the published table varies, in the units that we read into it. */
export const PUBLISHED_PANEL: Panel = {
  fields: [
    { parameter: 'lineSpacingUm', label: 'Width (our reading: line spacing)', unit: 'mm' },
    { parameter: 'powerPercent', label: 'Laserpower', unit: 'percentFromZero' },
    { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s' },
    { parameter: 'frequencyKhz', label: 'Pulsefrequency', unit: 'kHz' },
  ],
};
