import { measuredValue, measurementProblems } from './coupon-measurements-rules';
import type { NewMeasurementDto } from './dto/add-measurements.dto';

const D65 = { illuminant: 'D65', observer: '10°', geometry: '45/0' } as const;
const COLOUR: NewMeasurementDto = {
  cellId: 'c',
  quantity: 'lightness',
  value: 25.7,
  method: 'colorimeter',
  methodDetail: D65,
  instrument: 'CM-2',
};
const CODE: NewMeasurementDto = {
  cellId: 'c',
  quantity: 'code-grade',
  grade: 'B',
  method: 'verifier',
  methodDetail: { apertureMil: 6, light: '660 nm', angleDeg: 45 },
  instrument: 'Verifier 1',
};
const pointers = (measurement: NewMeasurementDto) => measurementProblems(measurement, '#/m').map(({ pointer }) => pointer);

describe('a measurement', () => {
  it('passes with its method’s conditions and instrument', () => {
    expect(pointers(COLOUR)).toEqual([]);
    expect(pointers(CODE)).toEqual([]);
    expect(pointers({ cellId: 'c', quantity: 'depth', value: -12, method: 'manual' })).toEqual([]);
    expect(pointers({ cellId: 'c', quantity: 'contrast', value: 0.9, method: 'photo', photoId: 'p' })).toEqual([]);
  });

  it('by a colorimeter needs illuminant, observer, geometry and the instrument', () => {
    expect(pointers({ ...COLOUR, methodDetail: { illuminant: 'D65' }, instrument: '' })).toEqual([
      '#/m/methodDetail/observer',
      '#/m/methodDetail/geometry',
      '#/m/instrument',
    ]);
  });

  it('of a code needs aperture, light and angle, and never comes from a photo', () => {
    expect(pointers({ ...CODE, methodDetail: { light: '' } })).toEqual([
      '#/m/methodDetail/apertureMil',
      '#/m/methodDetail/light',
      '#/m/methodDetail/angleDeg',
    ]);
    expect(pointers({ cellId: 'c', quantity: 'code-grade', value: 4, method: 'photo', photoId: 'p' })).toEqual(['#/m/method']);
  });

  it('refuses conditions of another method, another unit and a value that cannot be', () => {
    expect(pointers({ ...COLOUR, methodDetail: { ...D65, apertureMil: 6 } })).toEqual(['#/m/methodDetail/apertureMil']);
    expect(pointers({ ...COLOUR, unit: 'µm' })).toEqual(['#/m/unit']);
    expect(pointers({ ...COLOUR, value: 100.1 })).toEqual(['#/m/value']);
    expect(pointers({ ...COLOUR, grade: 'A' })).toEqual(['#/m/grade']);
    const { value: _, ...empty } = COLOUR;
    expect(pointers(empty)).toEqual(['#/m/value']);
  });

  it('of a crater comes from a microscope or a calliper, and is 0 where a pulse left none', () => {
    const crater: NewMeasurementDto = { cellId: 'c', quantity: 'crater-diameter', value: 0, method: 'microscope', instrument: 'M 2' };
    expect(pointers(crater)).toEqual([]);
    expect(pointers({ ...crater, method: 'calliper', value: 34.5, unit: 'µm' })).toEqual([]);
    expect(pointers({ ...crater, method: 'photo', photoId: 'p' })).toEqual(['#/m/method']);
    expect(pointers({ ...crater, value: -1 })).toEqual(['#/m/value']);
  });

  it('from a photo names the photo, and one that supersedes names the reason', () => {
    expect(pointers({ cellId: 'c', quantity: 'contrast', value: 0.9, method: 'photo' })).toEqual(['#/m/photoId']);
    expect(pointers({ ...COLOUR, supersedesId: 'm' })).toEqual(['#/m/reason']);
    expect(pointers({ ...COLOUR, supersedesId: 'm', reason: 'typing slip' })).toEqual([]);
  });

  it.each([
    [{ grade: 'A' }, 4],
    [{ grade: 'F' }, 0],
    [{ grade: 'A', value: 3.6 }, 3.6],
    [{ value: 0 }, 0],
    [{}, null],
  ] as const)('stands as a number: %j is %p', (given, value) => {
    expect(measuredValue(given)).toBe(value);
  });
});
