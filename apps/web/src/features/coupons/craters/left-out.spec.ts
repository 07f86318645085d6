import { leftOutByReason } from './left-out';

const point = (address: string, excludedBecause: string | null) => ({
  ...{ address, excludedBecause, diameterUm: 30, pulseEnergyUj: 40, series: null, isFarAbove: false },
});

it('cells that the line leaves out are told together where the reason is the same', () => {
  const points = [point('A1', null), point('B1', '2 pulses'), point('A2', 'lines touch'), point('B2', '2 pulses')];
  expect(leftOutByReason(points)).toEqual([
    { reason: '2 pulses', addresses: ['B1', 'B2'] },
    { reason: 'lines touch', addresses: ['A2'] },
  ]);
});
