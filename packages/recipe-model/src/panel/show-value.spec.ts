import type { SetValue } from '../vocabulary/setting';
import type { PanelField } from './panel';
import { showValue } from './show-value';

const MM: PanelField = { parameter: 'lineSpacingUm', label: 'Spacing', unit: 'mm', step: 0.0005 };
const LPI: PanelField = { parameter: 'lineSpacingUm', label: 'Lines', unit: 'lpi', step: 1 };
const THIRTY: SetValue = { entered: { value: 0.03, unit: 'mm' }, physical: 30 };

describe('showValue', () => {
  it('shows what was typed where the panel has that unit', () => {
    expect(showValue(MM, THIRTY, { decimalSign: ',' })).toEqual({
      value: 0.03,
      text: '0,03',
      symbol: 'mm',
      spoken: 'millimetres',
      isShowable: true,
    });
  });

  it('says when another panel cannot show the converted value', () => {
    const shown = showValue(LPI, THIRTY);
    expect(shown?.value).toBeCloseTo(846.6666667, 6);
    expect(shown).toMatchObject({ text: '846.666666667', isShowable: false });
  });

  it('uses the true minus', () => {
    const field: PanelField = { parameter: 'focusOffsetMm', label: 'Focus', unit: 'mm', step: 0.05 };
    expect(showValue(field, { entered: { value: -1.5, unit: 'mm' }, physical: -1.5 })?.text).toBe('−1.5');
  });

  it('gives nothing where the panel misses its range', () => {
    const field: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'percentFromZero' };
    expect(showValue(field, { entered: { value: 800, unit: 'mm/s' }, physical: 800 })).toBeNull();
  });
});
