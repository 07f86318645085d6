import type { Panel } from '@proofplate/recipe-model';
import { emptyImport, type ImportValues, importBody, levelTexts } from './import-values';

const panel: Panel = { fields: [{ parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', maximum: 1000, step: 10 }] };
const plate = (given: Partial<ImportValues> = {}): ImportValues => ({
  ...emptyImport(),
  ...{ materialId: 'm', finishId: 'f', effectId: 'e', machineId: 'x', lensId: 'l' },
  grid: { ...emptyImport().grid, rows: '2', columns: '3', rowFactor: { parameter: 'speedMmPerS', levels: '205, 5000' } },
  ...given,
});
const read = (values: ImportValues) => importBody(values, panel, 'en-GB');

describe('importBody()', () => {
  it('sends what is known and leaves out what is not', () => {
    expect(read(plate())).toEqual({
      body: {
        ...{ materialId: 'm', finishId: 'f', effectId: 'e', machineId: 'x', lensId: 'l', title: '', lot: '', storedAt: '' },
        ...{ markedByMe: false, isMachineUnchanged: false, common: {} },
        grid: {
          ...{ rows: 2, columns: 3 },
          // beyond today's panel, but that is what was dialled in then
          rowFactor: {
            parameter: 'speedMmPerS',
            levels: [
              { value: 205, unit: 'mm/s' },
              { value: 5000, unit: 'mm/s' },
            ],
          },
        },
      },
    });
  });

  it('sends the table alone when the settings are pasted', () => {
    const answer = read(plate({ from: 'table', table: 'Cell\tSpeed\nA1\t800' }));
    expect(answer).toMatchObject({ body: { table: 'Cell\tSpeed\nA1\t800', decimalSign: '.' } });
    expect(answer).not.toHaveProperty('body.grid');
  });

  it('says every wrong field at once', () => {
    const answer = read(plate({ materialId: '', cellMm: 'big', grid: { ...plate().grid, rows: '' }, common: { speedMmPerS: 'fast' } }));
    expect('messages' in answer && answer.messages.map(({ name }) => name)).toEqual([
      'materialId',
      'common.speedMmPerS',
      'cellMm',
      'grid.rows',
    ]);
  });
});

describe('levelTexts()', () => {
  it.each([
    ['100, 140 190', false, ['100', '140', '190']],
    ['0,1; 0,2', true, ['0,1', '0,2']],
    ['0,1 0,2', true, ['0,1', '0,2']],
    ['', false, []],
  ])('parts %j', (text, isCommaDecimal, parts) => {
    expect(levelTexts(text, isCommaDecimal)).toEqual(parts);
  });
});
