import { chakra } from '@chakra-ui/react';
import { NumberField } from '../../../components/field';

export type TypedArea = { width: string; height: string };
export type AreaFieldsProps = {
  area: TypedArea;
  onChange: (area: TypedArea) => void;
  errors?: { width?: string | undefined; height?: string | undefined };
  help?: string;
};

/** Marked area of the part: width along the lines, height across them. */
export function AreaFields({ area, onChange, errors = {}, help }: AreaFieldsProps) {
  return (
    <chakra.div display="grid" gridTemplateColumns="repeat(2, minmax(0, 1fr))" gap="3" alignItems="start">
      <NumberField
        name="area-width"
        label="Width along the lines"
        unit="mm"
        size="glove"
        help={help}
        value={area.width}
        error={errors.width}
        onChange={(event) => onChange({ ...area, width: event.currentTarget.value })}
      />
      <NumberField
        name="area-height"
        label="Height across them"
        unit="mm"
        size="glove"
        value={area.height}
        error={errors.height}
        onChange={(event) => onChange({ ...area, height: event.currentTarget.value })}
      />
    </chakra.div>
  );
}
