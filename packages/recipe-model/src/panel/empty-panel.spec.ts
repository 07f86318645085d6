import { SOURCE_KINDS } from '../vocabulary/lists';
import { PARAMETERS } from '../vocabulary/parameters';
import { emptyPanelFor } from './empty-panel';
import { isShowable } from './showable';

describe('emptyPanelFor', () => {
  it.each(SOURCE_KINDS)('gives %s fields in units that their parameters have, each once', (kind) => {
    const { fields } = emptyPanelFor(kind);
    for (const field of fields) expect(PARAMETERS[field.parameter].panelUnits).toContain(field.unit);
    expect(new Set(fields.map((field) => field.parameter)).size).toBe(fields.length);
    expect(fields.map((field) => field.parameter)).toEqual(expect.arrayContaining(['powerPercent', 'speedMmPerS', 'passes']));
  });

  it('lets only a source with settable pulse width set it', () => {
    const hasWidth = (kind: (typeof SOURCE_KINDS)[number]) =>
      emptyPanelFor(kind).fields.some((field) => field.parameter === 'pulseWidthNs');
    expect(SOURCE_KINDS.filter(hasWidth)).toEqual(['fibre-mopa']);
  });

  it('can show half a micrometre of line spacing', () => {
    const spacing = emptyPanelFor('fibre-mopa').fields.find((field) => field.parameter === 'lineSpacingUm');
    expect(spacing !== undefined && isShowable(spacing, 0.0305)).toBe(true);
  });

  it('gives fresh fields each time', () => {
    emptyPanelFor('co2').fields[0].label = 'Changed';
    expect(emptyPanelFor('co2').fields[0].label).toBe('Power');
  });
});
