import { formatQuantity } from '../../../lib/format';
import type { Calibration } from '../machines.api';

/** "1064 nm · 60 kHz · 200 ns": what a reading holds for. */
export function conditionsOf({
  wavelengthNm,
  frequencyKhz,
  pulseWidthNs,
}: Pick<Calibration, 'wavelengthNm' | 'frequencyKhz' | 'pulseWidthNs'>): string {
  return [
    formatQuantity(wavelengthNm, 'nm'),
    ...(frequencyKhz === null ? [] : [formatQuantity(frequencyKhz, 'kHz')]),
    ...(pulseWidthNs === null ? [] : [formatQuantity(pulseWidthNs, 'ns')]),
  ].join(' · ');
}
