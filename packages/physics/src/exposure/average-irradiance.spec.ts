import { expectReference } from '../../test/expect-reference';
import { averageIrradiance } from './average-irradiance';

describe('averageIrradiance', () => {
  expectReference('average irradiance of a focused beam', 'I_W_mm2', ({ P_W, d_um }) => averageIrradiance(P_W, d_um));

  it('times the spot area is the power', () => {
    expect(averageIrradiance(30, 60) * Math.PI * 0.03 ** 2).toBeCloseTo(30, 10);
  });

  it('refuses a negative power', () => {
    expect(() => averageIrradiance(-1, 60)).toThrow('powerW must be a finite number of at least 0, but is -1');
  });
});
