import { enterValue } from '../panel/enter-value';
import type { ParameterKey } from '../vocabulary/parameters';
import { stepNumbers } from './setting-numbers';
import { type TypedMachine, typedSetting } from './typed-setting';

const machine: TypedMachine = {
  panel: {
    fields: [
      { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 },
      { parameter: 'frequencyKhz', label: 'Pulses', unit: 'ppi' },
      { parameter: 'pulseWidthNs', label: 'Pulse width', unit: 'ns', choices: [100, 200] },
      { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 5000 },
      { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', step: 0.01 },
      { parameter: 'focusOffsetMm', label: 'Focus', unit: 'mm' },
    ],
  },
  physical: {
    ...{ sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 60 },
    maxPulseEnergyMj: [{ pulseWidthNs: 200, energyMj: 10 }],
  },
};
const typed: Partial<Record<ParameterKey, string>> = {
  ...{ powerPercent: '50', frequencyKhz: '2540', pulseWidthNs: '200', speedMmPerS: '100', lineSpacingUm: '0.03' },
};
const read = (texts: Partial<Record<ParameterKey, string>>) =>
  typedSetting(machine, {
    fill: 'both directions',
    read: (field, context) => {
      const text = texts[field.parameter] ?? '';
      return text === '' ? undefined : enterValue(field, text, context);
    },
  });
const numberOf = (texts: Partial<Record<ParameterKey, string>>, key: string) => {
  const optics = { physical: machine.physical, focalLengthMm: 163, measuredSpotUm: 50 };
  return stepNumbers(read(texts), { optics }).numbers.find((number) => number.key === key);
};

describe('typedSetting()', () => {
  it('reads every field by the panel’s rules, the speed before the pulses per inch', () => {
    const { values, power, unknownBecause } = read(typed);
    expect(values.frequencyKhz?.physical).toBeCloseTo(10, 9);
    expect(power).toEqual({ watts: 30, basis: 'not calibrated' });
    expect(unknownBecause).toEqual({});
  });

  it('says of each number why it is not known while a field that it rests on is empty', () => {
    const { lineSpacingUm: _, ...rest } = typed;
    expect(numberOf(rest, 'arealDose')?.missingBecause).toBe('no line spacing is set');
    expect(numberOf(rest, 'lineEnergy')?.value).toBeCloseTo(0.3, 9);
  });

  it('gives no number for a value that the panel cannot show, but the nearest that it can', () => {
    expect(numberOf({ ...typed, lineSpacingUm: '0.025' }, 'lineOverlap')?.missingBecause).toContain('0.02 mm or 0.03 mm');
  });

  it('takes an empty frequency of a pulsed source for missing, not for a continuous beam', () => {
    const { frequencyKhz: _, ...rest } = typed;
    expect(numberOf(rest, 'averageIrradiance')?.value).toBeUndefined();
    expect(numberOf(rest, 'pulseEnergy')?.missingBecause).toBe('no pulse frequency is set');
    expect(numberOf(rest, 'arealDose')?.missingBecause).toBe('no pulse frequency is set');
  });

  it('gives no watts without the pulse width that they rest on', () => {
    expect(numberOf({ ...typed, pulseWidthNs: '150' }, 'workPower')?.missingBecause).toContain('100 ns or 200 ns');
  });

  it('takes an empty focus offset for in focus', () => {
    expect(numberOf(typed, 'spotAtWork')?.value).toBe(50);
  });
});
