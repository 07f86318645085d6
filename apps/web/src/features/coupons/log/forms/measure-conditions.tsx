import type { MeasurementMethod } from '@proofplate/recipe-model';
import { useState } from 'react';
import { NumberField, SelectField, TextField } from '../../../../components/field';
import { readOptionalNumber } from '../../../../lib/read-number';
import type { MeasurementConditions } from '../log.api';
import { GEOMETRIES, ILLUMINANTS, OBSERVERS } from '../measuring';

export type MeasureConditionsProps = {
  method: MeasurementMethod;
  conditions: MeasurementConditions;
  onChange: (conditions: MeasurementConditions) => void;
  /** Message at a field that was left open. */
  errorAt: (name: string) => string | undefined;
  locale: string;
};

/** Conditions without which a number of the method cannot be compared. */
export function MeasureConditions({ method, conditions, onChange, errorAt, locale }: MeasureConditionsProps) {
  if (method === 'colorimeter') {
    return (
      <>
        <Choice
          name="illuminant"
          error={errorAt('illuminant')}
          label="Illuminant"
          values={ILLUMINANTS}
          value={conditions.illuminant}
          onChoose={(illuminant) => onChange({ ...conditions, illuminant })}
        />
        <Choice
          name="observer"
          error={errorAt('observer')}
          label="Observer"
          values={OBSERVERS}
          value={conditions.observer}
          onChoose={(observer) => onChange({ ...conditions, observer })}
        />
        <Choice
          name="geometry"
          error={errorAt('geometry')}
          label="Geometry of light and view"
          values={GEOMETRIES}
          value={conditions.geometry}
          onChoose={(geometry) => onChange({ ...conditions, geometry })}
        />
      </>
    );
  }
  if (method !== 'verifier') return null;
  return (
    <>
      <Typed
        name="aperture"
        error={errorAt('aperture')}
        label="Aperture"
        unit="mil"
        most={100}
        locale={locale}
        onRead={(apertureMil) => onChange({ ...conditions, apertureMil })}
      />
      <TextField
        name="light"
        error={errorAt('light')}
        label="Light"
        help="Wavelength or kind, such as 660 nm"
        maxLength={60}
        value={conditions.light ?? ''}
        onChange={({ target }) => onChange({ ...conditions, light: target.value })}
      />
      <Typed
        name="light-angle"
        error={errorAt('light-angle')}
        label="Angle of the light"
        unit="°"
        most={90}
        locale={locale}
        onRead={(angleDeg) => onChange({ ...conditions, angleDeg })}
      />
    </>
  );
}

type ChoiceProps<T extends string> = {
  name: string;
  label: string;
  values: readonly T[];
  value: T | undefined;
  onChoose: (value: T) => void;
  error: string | undefined;
};

function Choice<T extends string>({ name, label, values, value, onChoose, error }: ChoiceProps<T>) {
  return (
    <SelectField
      name={name}
      label={label}
      placeholder="Choose"
      error={error}
      value={value ?? ''}
      onChange={({ target }) => {
        const chosen = values.find((each) => each === target.value);
        if (chosen !== undefined) onChoose(chosen);
      }}
      options={values.map((each) => ({ value: each, label: each }))}
    />
  );
}

type TypedProps = {
  name: string;
  label: string;
  unit: string;
  most: number;
  locale: string;
  error: string | undefined;
  onRead: (value: number | undefined) => void;
};

function Typed({ name, label, unit, most, locale, error, onRead }: TypedProps) {
  const [text, setText] = useState('');
  const read = readOptionalNumber(text, { what: `The ${label.toLowerCase()}`, unit, least: 0, most }, locale);
  const handleChange = (next: string) => {
    setText(next);
    const again = readOptionalNumber(next, { what: label, unit, least: 0, most }, locale);
    onRead('value' in again ? again.value : undefined);
  };
  return (
    <NumberField
      name={name}
      label={label}
      unit={unit}
      error={'message' in read ? read.message : error}
      value={text}
      onChange={({ target }) => handleChange(target.value)}
    />
  );
}
