import { chakra, Flex } from '@chakra-ui/react';
import {
  isCodeOf,
  MEASUREMENT_METHODS,
  MEASUREMENT_QUANTITIES,
  METHOD_LABELS,
  type MeasurementMethod,
  type MeasurementQuantity,
  QUANTITIES,
} from '@proofplate/recipe-model';
import { Button } from '../../../components/button';
import { NumberField, SelectField } from '../../../components/field';
import { CrossIcon, PlusIcon } from '../../../components/icons';
import { readNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import type { PieceMeasurement } from '../runs.api';

export type TypedPiece = {
  key: number;
  piece: string;
  quantity: MeasurementQuantity;
  value: string;
  method: MeasurementMethod;
  read: number | undefined;
};

const LARGEST_VALUE = 1e9;
const QUANTITY_OPTIONS = MEASUREMENT_QUANTITIES.map((value) => ({ value, label: QUANTITIES[value].label }));
const METHOD_OPTIONS = MEASUREMENT_METHODS.map((value) => ({ value, label: METHOD_LABELS[value] }));

/** The measurements as the api takes them; undefined while one cannot be read. */
export function typedPieces(pieces: readonly TypedPiece[]): PieceMeasurement[] | undefined {
  const read = pieces.map(({ piece, quantity, read: value, method }) =>
    value === undefined || !/^[1-9]\d{0,5}$/.test(piece.trim()) ? undefined : { piece: Number(piece), quantity, value, method },
  );
  return read.every((measurement) => measurement !== undefined) ? read : undefined;
}

export type PieceMeasurementsProps = {
  pieces: readonly TypedPiece[];
  wasTried: boolean;
  onChange: (pieces: readonly TypedPiece[]) => void;
};

/** What was measured on each piece of a confirmation run; the server weighs it against the recorded criteria. */
export function PieceMeasurements({ pieces, wasTried, onChange }: PieceMeasurementsProps) {
  const last = pieces.at(-1);
  const add = () => {
    const next = {
      key: (last?.key ?? 0) + 1,
      piece: String(pieces.length + 1),
      quantity: last?.quantity ?? 'contrast',
      method: last?.method ?? 'photo',
      ...{ value: '', read: undefined },
    };
    onChange([...pieces, next]);
  };
  return (
    <chakra.fieldset display="grid" gap="3">
      <chakra.legend fontWeight="semibold" mb="1">
        Measured pieces
      </chakra.legend>
      {pieces.length === 0 && wasTried && (
        <chakra.p color="oxide.fg" role="alert">
          Measure at least one piece: this run proves a setting.
        </chakra.p>
      )}
      {pieces.map((piece, index) => (
        <PieceRow
          key={piece.key}
          piece={piece}
          wasTried={wasTried}
          onChange={(changed) => onChange(pieces.map((other, place) => (place === index ? changed : other)))}
          onRemove={() => onChange(pieces.filter((_, place) => place !== index))}
        />
      ))}
      <Button size="glove" icon={<PlusIcon />} onClick={add} justifySelf="start">
        Add a measurement
      </Button>
    </chakra.fieldset>
  );
}

type PieceRowProps = { piece: TypedPiece; wasTried: boolean; onChange: (piece: TypedPiece) => void; onRemove: () => void };

function PieceRow({ piece, wasTried, onChange, onRemove }: PieceRowProps) {
  const { shop } = useSession();
  const unit = QUANTITIES[piece.quantity].unit === '1' ? '' : QUANTITIES[piece.quantity].unit;
  const rule = { what: 'The value', unit, least: -LARGEST_VALUE, most: LARGEST_VALUE };
  const read = (text: string) => {
    const result = readNumber(text, rule, shop.locale);
    return 'value' in result ? { read: result.value } : { read: undefined, message: result.message };
  };
  const message = wasTried && piece.read === undefined ? read(piece.value).message : undefined;
  const name = (field: string) => `piece-${piece.key}-${field}`;
  return (
    <Flex gap="2" align="flex-end" wrap="wrap">
      <chakra.div width="80px">
        <NumberField
          name={name('number')}
          label="Piece"
          size="glove"
          value={piece.piece}
          onChange={(event) => onChange({ ...piece, piece: event.currentTarget.value })}
        />
      </chakra.div>
      <chakra.div flex="2" minW="180px">
        <SelectField
          name={name('quantity')}
          label="Quantity"
          options={QUANTITY_OPTIONS}
          minHeight={{ base: 'glove', lg: 'act' }}
          value={piece.quantity}
          onChange={({ currentTarget: { value } }) => {
            if (isQuantity(value)) onChange({ ...piece, quantity: value });
          }}
        />
      </chakra.div>
      <chakra.div flex="1" minW="120px">
        <NumberField
          name={name('value')}
          label="Value"
          unit={unit}
          size="glove"
          error={message}
          value={piece.value}
          onChange={(event) => onChange({ ...piece, value: event.currentTarget.value, read: read(event.currentTarget.value).read })}
        />
      </chakra.div>
      <chakra.div flex="2" minW="180px">
        <SelectField
          name={name('method')}
          label="Method"
          options={METHOD_OPTIONS}
          minHeight={{ base: 'glove', lg: 'act' }}
          value={piece.method}
          onChange={({ currentTarget: { value } }) => {
            if (isCodeOf(METHOD_LABELS, value)) onChange({ ...piece, method: value });
          }}
        />
      </chakra.div>
      <Button
        kind="quiet"
        size="glove"
        shape="square"
        aria-label={`Remove the measurement of piece ${piece.piece}`}
        icon={<CrossIcon />}
        onClick={onRemove}
      />
    </Flex>
  );
}

const isQuantity = (code: string): code is MeasurementQuantity => Object.hasOwn(QUANTITIES, code);
