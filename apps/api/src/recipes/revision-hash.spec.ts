import { day, parametersAt, revisionOf } from '../../test/support/revision-records';
import { hashOfRevision } from './revision-hash';

const KEYS = { materialId: 'm', finishId: 'f', effectId: 'e', machineId: 'b', lensId: 'l' };
const EVIDENCE = { basisCellIds: ['1', '2'], confirmationCellIds: ['3'] };
const hash = (given: Parameters<typeof revisionOf>[0] = {}, keys = KEYS, evidence = EVIDENCE) =>
  hashOfRevision(revisionOf(given), keys, evidence);

describe('hashOfRevision()', () => {
  it('is a SHA-256 that does not depend on the order in which evidence was linked', () => {
    expect(hash()).toMatch(/^[0-9a-f]{64}$/);
    expect(hash({}, KEYS, { ...EVIDENCE, basisCellIds: ['2', '1'] })).toBe(hash());
  });

  it('changes with everything that a signature covers', () => {
    const { content } = revisionOf();
    const [step] = content.steps;
    const changed = [
      hash({ content: { ...content, steps: [{ purpose: 'fill', parameters: parametersAt(410), pauseAfterS: 0 }] } }),
      hash({ content: { ...content, steps: [...content.steps, ...(step === undefined ? [] : [step])] } }),
      hash({ content: { ...content, setUpSteps: [{ text: 'Look', mustTick: true }] } }),
      hash({ content: { ...content, limits: { notes: 'Flat' } } }),
      hash({ content: { ...content, scope: {} } }),
      ...[
        { profileId: 'x' },
        { calibrationId: null },
        { reason: 'x' },
        { route: 'transferred' as const },
        { grounds: 'x' },
        { groundsBy: 'x' },
      ].map((given) => hash(given)),
      ...[{ recipeId: 'x' }, { basedOnId: 'x' }, { createdBy: 'x' }, { effectiveFrom: day('2027-01-01') }].map((given) => hash(given)),
      ...(['materialId', 'finishId', 'effectId', 'machineId', 'lensId'] as const).map((key) => hash({}, { ...KEYS, [key]: 'x' })),
      hash({}, KEYS, { ...EVIDENCE, basisCellIds: ['1'] }),
      hash({}, KEYS, { ...EVIDENCE, confirmationCellIds: ['4'] }),
      hash({}, KEYS, { basisCellIds: ['1', '2', '3'], confirmationCellIds: [] }),
    ];
    expect(new Set([hash(), ...changed]).size).toBe(changed.length + 1);
  });

  it('stays through what the server gives at submit and approval', () => {
    const given = {
      number: 3,
      state: 'approved' as const,
      reviewDue: day('2027-05-01'),
      submittedAt: day('2026-05-05'),
      approvedAt: day('2026-05-06'),
      version: 7,
    };
    expect(hash(given)).toBe(hash());
  });
});
