import type { Panel } from '@proofplate/recipe-model';
import { besidePanel, type ShownStep, settingRows } from './setting-rows';

const panel: Panel = {
  fields: [
    { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', step: 1 },
    { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', step: 0.5 },
    { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', step: 0.001 },
    { parameter: 'focusOffsetMm', label: 'Focus offset', unit: 'mm', step: 0.1 },
    { parameter: 'wobbleDiameterUm', label: 'Wobble', unit: 'mm' },
  ],
};
const step: ShownStep = {
  purpose: 'fill',
  pauseAfterS: 0,
  parameters: {
    values: {
      powerPercent: { entered: { value: 30, unit: 'percentFromZero' }, physical: 30 },
      speedMmPerS: { entered: { value: 900, unit: 'mm/s' }, physical: 900 },
      lineSpacingUm: { entered: { value: 0.03, unit: 'mm' }, physical: 30 },
      focusOffsetMm: { entered: { value: 0.5, unit: 'mm' }, physical: 0.5 },
      passes: { entered: { value: 2, unit: 'count' }, physical: 2 },
    },
    fill: 'crossed',
    assist: 'air',
    power: { watts: 5.8, basis: 'calibration' },
  },
};

describe('settingRows()', () => {
  it('shows what is dialled in the order of the panel, with its decimals, and leaves out what is not set', () => {
    const rows = settingRows(step, panel, '.').map(({ label, value, unit }) => [label, value, unit]);
    expect(rows).toEqual([
      ['Speed', '900', 'mm/s'],
      ['Power', '30.0', '%'],
      ['Line spacing', '0.030', 'mm'],
      ['Focus offset', '+0.5', 'mm'],
    ]);
  });

  it('puts the physical value beside what is dialled where the panel shows it otherwise', () => {
    const notes = Object.fromEntries(settingRows(step, panel, '.').map(({ key, note }) => [key, note]));
    expect(notes).toMatchObject({
      powerPercent: '5.80\u00A0W at the work',
      lineSpacingUm: '30 µm',
      focusOffsetMm: 'surface farther from the lens',
    });
    expect(notes.speedMmPerS).toBeUndefined();
  });

  it('says in a word that the watts are not known, and keeps the reason apart', () => {
    const power = { watts: null, reason: 'No calibration fits.' };
    const rows = settingRows({ ...step, parameters: { ...step.parameters, power } }, panel, '.');
    expect(rows.find(({ key }) => key === 'powerPercent')).toMatchObject({ note: 'watts not known', noteReason: 'No calibration fits.' });
  });

  it('writes the decimal sign of the shop', () => {
    expect(settingRows(step, panel, ',').map(({ value }) => value)).toEqual(['900', '30,0', '0,030', '+0,5']);
  });
});

describe('besidePanel()', () => {
  it('names fill, assist and what the panel has no field for', () => {
    expect(besidePanel(step, panel, '.').map(({ label }) => label)).toEqual(['Fill', 'Assist', 'Passes']);
  });
});
