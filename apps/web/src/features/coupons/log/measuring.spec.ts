import type { Measurement } from './log.api';
import { type MeasuringCommon, measurementsOf, missingConditions, readResult, refusedCells } from './measuring';

const COMMON: MeasuringCommon = {
  quantity: 'lightness',
  method: 'colorimeter',
  instrument: 'Colorimeter 1',
  methodDetail: { illuminant: 'D65', observer: '10°', geometry: '45/0' },
  uncertainty: 0.4,
  replaceReason: undefined,
};
const stored: Measurement = {
  id: 'm1',
  cellId: 'a',
  quantity: 'lightness',
  value: 52,
  grade: null,
  unit: '1',
  method: 'colorimeter',
  methodDetail: {},
  instrument: '',
  photoId: null,
  uncertainty: null,
  measuredAt: '2026-05-13T09:24:00Z',
  by: 'Me',
  supersedesId: null,
  isSuperseded: false,
  counts: true,
  reason: '',
};

describe('typed measurements', () => {
  it('leave out what is empty or cannot be read, and keep everything else', () => {
    const typed = new Map([
      ['a', '25,7'],
      ['b', ''],
      ['c', 'dark'],
      ['d', '30'],
    ]);
    expect(measurementsOf(typed, COMMON, { earlier: [stored], locale: 'de-DE' })).toEqual([
      expect.objectContaining({ cellId: 'a', value: 25.7, uncertainty: 0.4, instrument: 'Colorimeter 1' }),
      expect.objectContaining({ cellId: 'd', value: 30 }),
    ]);
  });

  it('take the place of the value that counts only with a reason', () => {
    const typed = new Map([
      ['a', '25'],
      ['b', '26'],
    ]);
    const [first, second] = measurementsOf(typed, { ...COMMON, replaceReason: 'digits swapped' }, { earlier: [stored], locale: 'en' });
    expect(first).toMatchObject({ supersedesId: 'm1', reason: 'digits swapped' });
    expect(second).not.toHaveProperty('supersedesId');
  });

  it('may be the letter of a code grade, and are never guessed', () => {
    expect(readResult(' b ', 'code-grade', 'en')).toEqual({ grade: 'B' });
    expect(readResult('b', 'lightness', 'en')).toHaveProperty('message');
    expect(readResult('1,234', 'lightness', 'en')).toHaveProperty('message');
    expect(readResult('12 µm', 'depth', 'en')).toEqual({ value: 12 });
  });

  it('find the cell of a refusal again, and tell what concerns all of them', () => {
    const sent = measurementsOf(
      new Map([
        ['a', '1'],
        ['d', '2'],
      ]),
      COMMON,
      { earlier: [], locale: 'en' },
    );
    const { cells, others } = refusedCells(
      [
        { pointer: '#/measurements/1/value', detail: 'too high' },
        { pointer: '#/measurements/0/instrument', detail: 'name it' },
        { pointer: '#/measurements/1/instrument', detail: 'name it' },
      ],
      sent,
    );
    expect([...cells]).toEqual([['d', 'too high']]);
    expect(others).toEqual(['name it']);
  });
});

describe('missingConditions()', () => {
  it('names every open field of a method, and asks nothing of what is given by hand', () => {
    const names = (...given: Parameters<typeof missingConditions>) => missingConditions(...given).map(({ name }) => name);
    expect(names('colorimeter', { instrument: ' ', illuminant: 'D65' })).toEqual(['instrument', 'observer', 'geometry']);
    expect(names('verifier', { instrument: 'V1', apertureMil: 6, light: '', angleDeg: 45 })).toEqual(['light']);
    expect(names('manual', { instrument: '' })).toEqual([]);
  });
});

describe('readResult()', () => {
  it('refuses what the quantity cannot be', () => {
    expect(readResult('25.5', 'wipe-test', 'en-GB')).toHaveProperty('message');
    expect(readResult('25', 'wipe-test', 'en-GB')).toEqual({ value: 25 });
    expect(readResult('-3', 'evenness', 'en-GB')).toHaveProperty('message');
  });
});
