import fc from 'fast-check';
import { type PanelScale, panelValue, physicalValue } from './panel-conversion';

const SCALES: PanelScale[] = [
  ...(['mm/s', 'm/s', 'in/s', 'm/min', 'mm/min'] as const).map((panelUnit) => ({ panelUnit, storedUnit: 'mm/s' as const })),
  ...(['kHz', 'Hz'] as const).map((panelUnit) => ({ panelUnit, storedUnit: 'kHz' as const })),
  ...(['um', 'mm', 'in', 'lpi', 'lpcm'] as const).map((panelUnit) => ({ panelUnit, storedUnit: 'um' as const })),
  ...(['ns', 'us'] as const).map((panelUnit) => ({ panelUnit, storedUnit: 'ns' as const })),
  { panelUnit: 'um', storedUnit: 'mm' },
  { panelUnit: 'in', storedUnit: 'mm' },
  { panelUnit: 'count', storedUnit: 'count' },
  { panelUnit: 'deg', storedUnit: 'deg' },
  { panelUnit: 'percentFromZero', storedUnit: 'percentFromZero' },
  { panelUnit: 'percentFromMinimum', storedUnit: 'percentFromZero', rangeLow: 10, rangeHigh: 100 },
  { panelUnit: 'W', storedUnit: 'percentFromZero', rangeHigh: 60 },
  { panelUnit: 'percentFromZero', storedUnit: 'mm/s', rangeLow: 1, rangeHigh: 7000 },
  { panelUnit: 'percentFromMinimum', storedUnit: 'kHz', rangeLow: 20, rangeHigh: 200 },
  { panelUnit: 'ppi', storedUnit: 'kHz', speedMmPerS: 300 },
];

describe('physicalValue and panelValue', () => {
  it.each(SCALES)('round trip from $panelUnit to $storedUnit and back within 1e-9', (scale) => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1e5, noNaN: true }), (value) => {
        const back = panelValue(physicalValue(value, scale), scale);
        expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * value);
      }),
    );
  });

  it.each<[number, PanelScale, number]>([
    [850, { panelUnit: 'lpi', storedUnit: 'um' }, 29.88235294117647],
    [200, { panelUnit: 'lpcm', storedUnit: 'um' }, 50],
    [0.07, { panelUnit: 'mm', storedUnit: 'um' }, 70],
    [0.8, { panelUnit: 'm/s', storedUnit: 'mm/s' }, 800],
    [60, { panelUnit: 'm/min', storedUnit: 'mm/s' }, 1000],
    [10, { panelUnit: 'in/s', storedUnit: 'mm/s' }, 254],
    [30_000, { panelUnit: 'Hz', storedUnit: 'kHz' }, 30],
    [50, { panelUnit: 'percentFromMinimum', storedUnit: 'kHz', rangeLow: 20, rangeHigh: 200 }, 110],
    [50, { panelUnit: 'percentFromZero', storedUnit: 'kHz', rangeLow: 20, rangeHigh: 200 }, 100],
    [12, { panelUnit: 'W', storedUnit: 'percentFromZero', rangeHigh: 60 }, 20],
    [500, { panelUnit: 'ppi', storedUnit: 'kHz', speedMmPerS: 254 }, 5],
    [0.2, { panelUnit: 'us', storedUnit: 'ns' }, 200],
  ])('reads %d on the panel %j as %d', (shown, scale, physical) => {
    expect(physicalValue(shown, scale)).toBe(physical);
  });

  it('names what a unit needs', () => {
    expect(() => physicalValue(50, { panelUnit: 'percentFromZero', storedUnit: 'kHz' })).toThrow('rangeHigh is missing');
    expect(() => physicalValue(50, { panelUnit: 'percentFromMinimum', storedUnit: 'kHz', rangeHigh: 200 })).toThrow('rangeLow is missing');
    expect(() => physicalValue(50, { panelUnit: 'ppi', storedUnit: 'kHz' })).toThrow('speedMmPerS is missing');
    expect(() => physicalValue(50, { panelUnit: 'W', storedUnit: 'percentFromZero' })).toThrow('rangeHigh is missing');
    expect(() => physicalValue(0, { panelUnit: 'lpi', storedUnit: 'um' })).toThrow('value must be a finite number above 0');
    expect(() => physicalValue(5, { panelUnit: 'kHz', storedUnit: 'um' })).toThrow('kHz does not convert to um');
    expect(() => panelValue(5, { panelUnit: 'W', storedUnit: 'um' })).toThrow('W does not convert to um');
  });
});
