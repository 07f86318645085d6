import { expectWithin, referenceRecords } from '../../test/expect-reference';
import { pulseEnergy } from '../exposure/pulse-energy';
import { sourceLimitFrequency } from './source-limit-frequency';
import { sourceLimitPower } from './source-limit-power';

type Inputs = { readonly P_rated_W: number; readonly E_max_mJ: number; readonly f_kHz: readonly number[] };
type Expected = { readonly f0_kHz: number; readonly P_W: readonly number[]; readonly E_mJ: readonly number[] };

const records = referenceRecords<Inputs, Expected>('average power and pulse energy against repetition rate');

describe('source limit', () => {
  it.each(records.map((record) => [record.inputs.P_rated_W, record] as const))(
    'follows the reference of a %d W source',
    (_rated, record) => {
      const { P_rated_W, E_max_mJ, f_kHz } = record.inputs;
      expectWithin(sourceLimitFrequency(P_rated_W, E_max_mJ), record.expected.f0_kHz, 1e-9);
      for (const [index, frequencyKhz] of f_kHz.entries()) {
        const powerW = sourceLimitPower(P_rated_W, E_max_mJ, frequencyKhz);
        expectWithin(powerW, record.expected.P_W[index], 1e-9);
        expectWithin(pulseEnergy(powerW, frequencyKhz), record.expected.E_mJ[index], 1e-9);
      }
    },
  );

  it('refuses a source without a highest pulse energy', () => {
    expect(() => sourceLimitFrequency(20, 0)).toThrow('maxPulseEnergyMj must be a finite number above 0, but is 0');
    expect(() => sourceLimitPower(20, 0, 20)).toThrow('maxPulseEnergyMj must be a finite number above 0, but is 0');
  });
});
