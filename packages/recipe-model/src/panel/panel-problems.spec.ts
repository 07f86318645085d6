import { SOURCE_KINDS } from '../vocabulary/lists';
import { emptyPanelFor } from './empty-panel';
import type { PanelField } from './panel';
import { panelProblems } from './panel-problems';

const SPEED: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 7000, step: 1 };
const messages = (...fields: PanelField[]) => panelProblems({ fields }).map(({ message }) => message);

describe('panelProblems', () => {
  it.each(SOURCE_KINDS)('finds nothing in the panel to start from for %s', (kind) => {
    expect(panelProblems(emptyPanelFor(kind))).toEqual([]);
  });

  it('names every problem with its field', () => {
    const bad: PanelField = { ...SPEED, label: 'Pace', minimum: 10, maximum: 5, step: 0 };
    expect(panelProblems({ fields: [SPEED, bad] })).toEqual([
      { field: 1, message: 'Scan speed stands on the panel twice.' },
      { field: 1, message: 'Pace: the minimum must be below the maximum.' },
      { field: 1, message: 'Pace: the step must be above zero.' },
    ]);
  });

  it('asks for the range of a percent, except of power', () => {
    expect(messages({ parameter: 'frequencyKhz', label: 'Rate', unit: 'percentFromMinimum' })).toEqual([
      'Rate: a percent needs the value at 100 %.',
      'Rate: a percent from the minimum needs the value at 0 %.',
    ]);
    expect(messages({ parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero' })).toEqual([]);
    expect(messages({ parameter: 'powerPercent', label: 'Power', unit: 'W' })).toEqual(['Power: watts need the power at 100 %.']);
    expect(messages({ parameter: 'speedMmPerS', label: 'Speed', unit: 'percentFromZero', rangeLow: 9, rangeHigh: 9 })).toEqual([
      'Speed: the low end of the range must be below its high end.',
    ]);
  });

  it('ends a percent of a range at 100', () => {
    expect(messages({ parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', maximum: 7000 })).toEqual([
      'Power: a percent of the range ends at 100 %.',
    ]);
    expect(messages({ parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', maximum: 100 })).toEqual([]);
  });

  it('refuses units that the parameter does not have, and says which it has', () => {
    expect(messages({ ...SPEED, unit: 'kHz' })[0]).toContain('Scan speed is not shown in kilohertz. Possible: millimetres per second, ');
  });

  it('refuses missing labels, empty lists and numbers that are not finite', () => {
    expect(messages({ ...SPEED, label: ' ' })).toEqual(['A field needs the label that the panel shows.']);
    expect(messages({ ...SPEED, choices: [] })).toEqual(['Speed: a list of choices needs at least one.']);
    expect(messages({ ...SPEED, maximum: Number.NaN })).toEqual(['Speed: limits, step, choices and range must be numbers.']);
  });
});
