import fc from 'fast-check';
import { acceptEntered, enterValue } from './enter-value';
import type { PanelField } from './panel';

const SPEED: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 7000, step: 1 };
const SPACING: PanelField = { parameter: 'lineSpacingUm', label: 'Spacing', unit: 'mm', minimum: 0.001, maximum: 5, step: 0.0005 };
const DENSITY: PanelField = { parameter: 'lineSpacingUm', label: 'Lines', unit: 'lpi', minimum: 10, maximum: 2000, step: 10 };
const FREQUENCY: PanelField = {
  parameter: 'frequencyKhz',
  label: 'Frequency',
  unit: 'percentFromMinimum',
  minimum: 0,
  maximum: 100,
  step: 0.5,
  rangeLow: 20,
  rangeHigh: 200,
};
const WIDTH: PanelField = { parameter: 'pulseWidthNs', label: 'Pulse', unit: 'ns', choices: [4, 8, 14, 20, 30, 50, 100, 200] };
const WATTS: PanelField = { parameter: 'powerPercent', label: 'Power', unit: 'W', minimum: 0, maximum: 60, step: 0.1, rangeHigh: 60 };
const PASSES: PanelField = { parameter: 'passes', label: 'Repeats', unit: 'count', minimum: 1 };

describe('enterValue', () => {
  it('keeps number and unit as typed beside the physical value', () => {
    expect(enterValue(SPEED, '800')).toEqual({ kind: 'accepted', value: { entered: { value: 800, unit: 'mm/s' }, physical: 800 } });
    expect(enterValue(SPEED, '0.8 m/s')).toEqual({ kind: 'accepted', value: { entered: { value: 0.8, unit: 'm/s' }, physical: 800 } });
    expect(enterValue(SPACING, '0,0305')).toMatchObject({ value: { entered: { value: 0.0305, unit: 'mm' }, physical: 30.5 } });
    expect(enterValue(DENSITY, '850 lpi')).toMatchObject({ value: { entered: { value: 850, unit: 'lpi' } } });
    expect(enterValue(FREQUENCY, '50 %')).toMatchObject({ value: { entered: { value: 50, unit: 'percentFromMinimum' }, physical: 110 } });
    expect(enterValue(WATTS, '12')).toMatchObject({ value: { entered: { value: 12, unit: 'W' }, physical: 20 } });
    expect(enterValue(WATTS, '20 %')).toMatchObject({ value: { entered: { value: 20, unit: 'percentFromZero' }, physical: 20 } });
  });

  it('refuses what the panel cannot show, with the two nearest values that it can', () => {
    expect(enterValue(DENSITY, '847')).toEqual({
      kind: 'refused',
      reason: 'panel cannot show',
      message: 'Lines: the panel cannot show 847 lines/in. Nearest that it can: 840 lines/in or 850 lines/in.',
      nearest: [
        { value: 840, unit: 'lpi' },
        { value: 850, unit: 'lpi' },
      ],
    });
    expect(enterValue(DENSITY, '0.03 mm')).toMatchObject({
      message: 'Lines: the panel cannot show 0.03 mm (846.667 lines/in). Nearest that it can: 840 lines/in or 850 lines/in.',
      nearest: [{ value: 840 }, { value: 850 }],
    });
    expect(enterValue(SPACING, '0.0302')).toMatchObject({ nearest: [{ value: 0.03 }, { value: 0.0305 }] });
    expect(enterValue(WIDTH, '25')).toMatchObject({ nearest: [{ value: 20 }, { value: 30 }] });
  });

  it('names the limits of the panel', () => {
    expect(enterValue(SPEED, '9000')).toMatchObject({
      message: 'Speed: the panel cannot show 9000 mm/s. Speed must be 1 to 7000 mm/s. Nearest that it can: 6999 mm/s or 7000 mm/s.',
      nearest: [{ value: 6999 }, { value: 7000 }],
    });
    expect(enterValue(SPEED, '0.5')).toMatchObject({ nearest: [{ value: 1 }, { value: 2 }] });
  });

  it('ends a percent at 100, also where the panel states no end or one beyond it', () => {
    for (const maximum of [undefined, 7000]) {
      const power: PanelField = {
        parameter: 'powerPercent',
        label: 'Power',
        unit: 'percentFromZero',
        step: 1,
        ...(maximum === undefined ? {} : { maximum }),
      };
      expect(enterValue(power, '120')).toMatchObject({ kind: 'refused', nearest: [{ value: 99 }, { value: 100 }] });
      expect(enterValue(power, '100')).toMatchObject({ kind: 'accepted' });
    }
  });

  it('refuses what cannot be, and never suggests it', () => {
    expect(enterValue(SPEED, '0')).toMatchObject({ reason: 'impossible', nearest: [{ value: 1 }, { value: 2 }] });
    expect(enterValue(PASSES, '1.5')).toMatchObject({ reason: 'impossible', nearest: [{ value: 1 }, { value: 2 }] });
    expect(enterValue(PASSES, '-2')).toMatchObject({ reason: 'impossible', message: expect.stringContaining('cannot be below zero') });
    expect(enterValue(FREQUENCY, '0')).toMatchObject({ kind: 'accepted', value: { physical: 20 } });
  });

  it('refuses units that the parameter does not have', () => {
    expect(enterValue(SPEED, '20 kHz')).toMatchObject({
      reason: 'wrong unit',
      message: 'Speed is not measured in kilohertz. This panel shows millimetres per second.',
    });
    expect(enterValue(PASSES, '3 mm')).toMatchObject({ reason: 'wrong unit' });
  });

  it('passes both readings of an ambiguous number on', () => {
    expect(enterValue(SPEED, '1,500', { decimalSign: ',' })).toMatchObject({ reason: 'unreadable', readings: [1.5, 1500] });
  });

  it('turns pulses per inch into a frequency only at a scan speed', () => {
    const field: PanelField = { parameter: 'frequencyKhz', label: 'Pulses', unit: 'ppi', minimum: 10, maximum: 5000, step: 10 };
    expect(enterValue(field, '500', { speedMmPerS: 254 })).toMatchObject({ value: { physical: 5 } });
    expect(enterValue(field, '500')).toMatchObject({
      reason: 'not convertible',
      message: 'Pulses: pulses per inch need the scan speed. Set the speed first.',
    });
  });

  it('says so where a percent has no range', () => {
    const field: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'percentFromZero' };
    expect(enterValue(field, '50')).toMatchObject({ reason: 'not convertible', message: expect.stringContaining('Complete the field') });
    const power: PanelField = { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero' };
    expect(enterValue(power, '12 W')).toMatchObject({
      reason: 'not convertible',
      message: 'Power cannot be turned from watts into what this panel shows. Type it in percent of range, from zero.',
    });
  });

  it('suggests only values that it then accepts', () => {
    const fields = fc.constantFrom(SPEED, SPACING, DENSITY, FREQUENCY, WIDTH, WATTS, PASSES);
    fc.assert(
      fc.property(fields, fc.double({ min: -10, max: 1e5, noNaN: true }), (field, value) => {
        const entry = acceptEntered(field, { value, unit: field.unit });
        if (entry.kind === 'accepted') {
          expect(entry.value.entered).toEqual({ value, unit: field.unit });
          return;
        }
        expect(entry.nearest).toHaveLength(2);
        for (const near of entry.nearest ?? []) expect(acceptEntered(field, near).kind).toBe('accepted');
      }),
    );
  });

  it('suggests the neighbours: no showable value lies between them', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 7000, noNaN: true }), (value) => {
        const entry = acceptEntered(SPEED, { value, unit: 'mm/s' });
        if (entry.kind === 'accepted') return;
        expect(entry.nearest?.map((near) => near.value)).toEqual([Math.floor(value), Math.ceil(value)]);
      }),
    );
  });

  it('refuses numbers that are not finite in a request body', () => {
    expect(acceptEntered(SPEED, { value: Number.NaN, unit: 'mm/s' })).toMatchObject({ reason: 'unreadable' });
    expect(acceptEntered(SPEED, { value: Number.POSITIVE_INFINITY, unit: 'mm/s' })).toMatchObject({ reason: 'unreadable' });
  });
});
