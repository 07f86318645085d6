import type { Revision } from '../recipes.api';
import { type DraftValues, emptyStep, stepValues } from './draft-values';
import { readDraft } from './read-draft';

type PanelField = Revision['profile']['panel']['fields'][number];

const FIELDS: PanelField[] = [
  { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 },
  { parameter: 'frequencyKhz', label: 'Frequency', unit: 'kHz', minimum: 1, maximum: 1000, step: 0.001 },
  { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 8000, step: 1 },
  { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', minimum: 0.001, maximum: 1, step: 0.001 },
];

function values(step: Partial<DraftValues['steps'][number]>, rest: Partial<DraftValues> = {}): DraftValues {
  const none = { from: '', to: '' };
  return {
    steps: [{ ...emptyStep(FIELDS), ...step }],
    setUpSteps: [],
    limits: { thicknessMm: none, partDiameterMm: none, notes: '' },
    scope: {
      thicknessMm: none,
      partDiameterMm: none,
      featureKind: '',
      featureSizeMm: none,
      customerSpecification: '',
      materialGroupId: '',
    },
    reason: '',
    route: 'coupons',
    grounds: '',
    effectiveFrom: '',
    reviewDue: '',
    calibrationId: '',
    acknowledged: [],
    ...rest,
  };
}

const read = (draft: DraftValues, locale = 'en-GB') => readDraft(draft, FIELDS, locale);

describe('readDraft', () => {
  it('keeps number and unit as they were typed', () => {
    const { change, messages } = read(values({ values: { powerPercent: '60', speedMmPerS: '0.8 m/s', lineSpacingUm: '0.012 mm' } }));
    expect(messages).toEqual({});
    expect(change.steps?.[0]?.values).toEqual({
      powerPercent: { value: 60, unit: 'percentFromZero' },
      speedMmPerS: { value: 0.8, unit: 'm/s' },
      lineSpacingUm: { value: 0.012, unit: 'mm' },
    });
  });

  it('refuses what the panel cannot show with the two nearest, at its field, and still reads the rest', () => {
    const { change, messages } = read(values({ values: { powerPercent: '60.5' } }, { reason: 'darker' }));
    expect(messages['steps.0.values.powerPercent']).toContain('60 % or 61 %');
    expect(change.steps).toBeUndefined();
    expect(change.reason).toBe('darker');
  });

  it('refuses a number with two readings in every locale and offers both', () => {
    const { messages } = read(values({ values: { speedMmPerS: '1,500' } }), 'de-DE');
    expect(messages['steps.0.values.speedMmPerS']).toContain('1,5');
    expect(messages['steps.0.values.speedMmPerS']).toContain('1500');
  });

  it('sends a stored value back as it was entered, although typed anew it would have two readings', () => {
    const stored = { entered: { value: 21.125, unit: 'kHz' as const }, physical: 21.125 };
    const step = stepValues(
      {
        purpose: 'fill',
        parameters: { values: { frequencyKhz: stored }, fill: 'one direction', assist: 'none', power: { watts: null, reason: 'x' } },
        pauseAfterS: 0,
      },
      FIELDS,
      'en-GB',
    );
    expect(step.values.frequencyKhz).toBe('21.125');
    const { change, messages } = read(values(step));
    expect(messages).toEqual({});
    expect(change.steps?.[0]?.values).toEqual({ frequencyKhz: { value: 21.125, unit: 'kHz' } });
  });

  it('keeps what the panel has no field for', () => {
    const wobble = { wobbleDiameterUm: { value: 80, unit: 'um' as const } };
    expect(read(values({ stored: wobble, values: { powerPercent: '40' } })).change.steps?.[0]?.values).toEqual({
      ...wobble,
      powerPercent: { value: 40, unit: 'percentFromZero' },
    });
  });

  it('leaves open ends of a range open and refuses one that ends before it begins', () => {
    const scope = { ...values({}).scope, thicknessMm: { from: '1.5', to: '' }, featureSizeMm: { from: '5', to: '2' } };
    const { change, messages } = read(values({}, { scope }));
    expect(messages).toEqual({ 'scope.featureSizeMm.to': 'The upper end must not lie below the lower end.' });
    expect(change.scope).toBeUndefined();
    expect(read(values({}, { scope: { ...scope, featureSizeMm: { from: '2', to: '5' } } })).change.scope).toEqual({
      thicknessMm: { from: 1.5 },
      featureSizeMm: { from: 2, to: 5 },
    });
  });

  it('asks for the words of an empty set-up step', () => {
    const { messages } = read(values({}, { setUpSteps: [{ text: ' ', caution: '', mustTick: true, photoId: '' }] }));
    expect(messages).toEqual({ 'setUpSteps.0.text': 'Say what to do, or take the step out.' });
  });

  it('takes a day as noon of that day and no day as none', () => {
    const { change } = read(values({}, { effectiveFrom: '2026-12-24' }));
    expect([change.effectiveFrom, change.reviewDue]).toEqual(['2026-12-24T12:00:00.000Z', null]);
  });
});
