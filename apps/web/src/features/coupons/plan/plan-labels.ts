import { PARAMETER_KEYS, type Panel } from '@proofplate/recipe-model';

/** Names and labels of every field of the plan, as its summary and its list of open fields say them. */
export function labelsOf(panel: Panel | undefined): Readonly<Record<string, string>> {
  const labelOf = new Map(panel?.fields.map(({ parameter, label }) => [parameter, label]));
  const setting = (name: string, prefix: string) =>
    PARAMETER_KEYS.flatMap((key) => {
      const label = labelOf.get(key);
      return label === undefined ? [] : [[`${name}.values.${key}`, `${prefix}${label}`] as const];
    });
  const factor = (name: string, title: string) => [
    [`${name}.parameter`, `${title}, what varies`] as const,
    [`${name}.from`, `${title}, from`] as const,
    [`${name}.to`, `${title}, to`] as const,
    [`${name}.count`, `${title}, levels`] as const,
  ];
  return {
    ...{ machineId: 'Machine', lensId: 'Lens', materialId: 'Material', finishId: 'Finish', effectId: 'Effect wanted' },
    ...{ thicknessMm: 'Thickness', lot: 'Lot', title: 'What it is for' },
    ...Object.fromEntries([...factor('rows', 'Rows'), ...factor('columns', 'Columns')]),
    ...Object.fromEntries([...setting('base', ''), ...setting('labelStep', 'Labels, ')]),
    ...{ 'base.fill': 'Fill', cellMm: 'Cell', gapMm: 'Gap', doseCautionJPerMm2: 'Flag cells from a dose of' },
    acknowledgedCautionIds: 'Cautions',
  };
}
