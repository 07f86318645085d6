import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { PUBLISHED_RUNS } from './plastic-marking-doe16';

const [header, ...lines] = readFileSync(join(__dirname, 'plastic-marking-doe16.csv'), 'utf8').trim().split(/\r?\n/);

describe('the published design', () => {
  it('has the columns of the notebook', () => {
    expect(header).toBe('Width,Laserpower,Speed,Pulsefrequency,UDIcontrast,Contrast1,percentage');
  });

  it('is the table as it was copied, row by row', () => {
    const rows = PUBLISHED_RUNS.map(({ width, laserpower, speed, pulsefrequency, udiContrast, contrast1, percentage }) =>
      [width.toFixed(2), laserpower, speed, pulsefrequency, udiContrast, contrast1, percentage].join(','),
    );
    expect(rows).toEqual(lines);
  });

  it('stands beside its licence and a note on our reading', () => {
    expect(readFileSync(join(__dirname, 'LICENSE-plastic-marking-doe16.txt'), 'utf8')).toContain('MIT License');
    expect(readFileSync(join(__dirname, 'README.md'), 'utf8')).toContain('an assumption');
  });
});
