import { MATERIAL_FAMILIES } from '@proofplate/recipe-model';
import { type NumberRule, readOptionalNumber, typedLength, typedNumber } from '../../../lib/read-number';
import type { Material, MaterialBody, PropertyKey } from '../materials.api';

/** The form as it is typed: everything is text. Names follow the request. */
export type MaterialValues = {
  name: string;
  family: string;
  grade: string;
  standardDesignation: string;
  supplier: string;
  thicknessMm: string;
  properties: Record<PropertyKey, { value: string; source: string }>;
  notes: string;
};

export const THICKNESS: NumberRule = { what: 'The thickness', unit: 'mm', least: 0.001, most: 1000, isShopLength: true };
export const PROPERTY_RULES: readonly { key: PropertyKey; label: string; rule: NumberRule }[] = [
  {
    key: 'thermalConductivityWPerMK',
    label: 'Thermal conductivity',
    rule: { what: 'The conductivity', unit: 'W/(m·K)', least: 0.001, most: 3000 },
  },
  { key: 'densityKgPerM3', label: 'Density', rule: { what: 'The density', unit: 'kg/m³', least: 1, most: 25_000 } },
  { key: 'heatCapacityJPerKgK', label: 'Heat capacity', rule: { what: 'The heat capacity', unit: 'J/(kg·K)', least: 10, most: 20_000 } },
];

export function materialValues(material: Material | undefined, locale: string): MaterialValues {
  const property = (key: PropertyKey) => ({
    value: typedNumber(material?.properties[key]?.value, locale),
    source: material?.properties[key]?.source ?? '',
  });
  return {
    name: material?.name ?? '',
    family: material === undefined ? '' : MATERIAL_FAMILIES[material.family].label,
    grade: material?.grade ?? '',
    standardDesignation: material?.standardDesignation ?? '',
    supplier: material?.supplier ?? '',
    thicknessMm: typedLength(material?.thicknessMm, locale),
    properties: {
      thermalConductivityWPerMK: property('thermalConductivityWPerMK'),
      densityKgPerM3: property('densityKgPerM3'),
      heatCapacityJPerKgK: property('heatCapacityJPerKgK'),
    },
    notes: material?.notes ?? '',
  };
}

/** What is sent, from values whose every field has passed its own check. */
export function materialBody(values: MaterialValues, locale: string): MaterialBody {
  const number = (text: string, rule: NumberRule) => {
    const read = readOptionalNumber(text, rule, locale);
    return 'value' in read ? (read.value ?? null) : null;
  };
  const properties = PROPERTY_RULES.flatMap(({ key, rule }) => {
    const value = number(values.properties[key].value, rule);
    return value === null ? [] : [[key, { value, source: values.properties[key].source.trim() }] as const];
  });
  return {
    name: values.name.trim(),
    family: values.family.trim(),
    grade: values.grade.trim(),
    standardDesignation: values.standardDesignation.trim(),
    supplier: values.supplier.trim(),
    thicknessMm: number(values.thicknessMm, THICKNESS),
    properties: Object.fromEntries(properties),
    notes: values.notes.trim(),
  };
}
