import { Box, chakra, Flex } from '@chakra-ui/react';
import { MEASUREMENT_QUANTITIES, METHOD_LABELS, QUANTITIES } from '@proofplate/recipe-model';
import { useEffect, useRef, useState } from 'react';
import { Button } from '../../../../components/button';
import { Dialog } from '../../../../components/dialog';
import { ErrorSummary, type SummaryEntry } from '../../../../components/error-summary';
import { NumberField, SelectField, TextField } from '../../../../components/field';
import { ProblemNotice } from '../../../../components/problem-notice';
import { ProblemError } from '../../../../lib/api';
import { formatNumber } from '../../../../lib/format';
import { useIdempotencyKey } from '../../../../lib/idempotency-key';
import { readOptionalNumber } from '../../../../lib/read-number';
import type { CouponCell, TestGrid } from '../../coupons.api';
import { addMeasurements, type Inspection, type MeasurementConditions } from '../log.api';
import { counting, measurementsOf, missingConditions, readResult, refusedCells, typedMethods } from '../measuring';
import { MeasureConditions } from './measure-conditions';
import { MeasureGrid } from './measure-grid';

type Texts = ReadonlyMap<string, string>;
const NO_TEXTS: Texts = new Map();

export type MeasureDialogProps = {
  couponId: string;
  grid: TestGrid;
  cells: readonly CouponCell[];
  inspection: Inspection;
  locale: string;
  onClose: () => void;
  onSaved: (count: number) => void;
};

/** One quantity, one method, and a field for each cell. */
export function MeasureDialog({ couponId, grid, cells, inspection, locale, onClose, onSaved }: MeasureDialogProps) {
  const [quantity, setQuantity] = useState<keyof typeof QUANTITIES>('lightness');
  const [method, setMethod] = useState(typedMethods('lightness')[0] ?? 'manual');
  const [conditions, setConditions] = useState<MeasurementConditions>({});
  const [instrument, setInstrument] = useState('');
  const [uncertainty, setUncertainty] = useState('');
  const [replaceReason, setReplaceReason] = useState('');
  const grids = useTexts();
  const [refused, setRefused] = useState<Texts>(NO_TEXTS);
  const [notice, setNotice] = useState<{ what: string; todo: string }>();
  const [isBusy, setIsBusy] = useState(false);
  const [missing, setMissing] = useState<readonly SummaryEntry[]>([]);
  const [isLeaving, setIsLeaving] = useState(false);
  const summary = useRef<HTMLDivElement>(null);
  const key = useIdempotencyKey();

  const { unit, label } = QUANTITIES[quantity];
  const earlier = new Map(
    cells.flatMap(({ id }): [string, string][] => {
      const value = counting(inspection.measurements, id, quantity)?.value;
      return value === null || value === undefined ? [] : [[id, formatNumber(value, { locale })]];
    }),
  );
  const typedIds = [...grids.typed].filter(([, text]) => text.trim() !== '').map(([id]) => id);
  const problems = new Map([...refused, ...unreadable(grids.typed, (text) => readResult(text, quantity, locale))]);
  const replaces = typedIds.some((id) => earlier.has(id));
  const spread = readOptionalNumber(uncertainty, { what: 'The uncertainty', unit: unit === '1' ? '' : unit, least: 0, most: 1e9 }, locale);

  const handleQuantity = (next: string) => {
    const found = MEASUREMENT_QUANTITIES.find((code) => code === next) ?? 'lightness';
    setQuantity(found);
    if (!typedMethods(found).includes(method)) handleMethod(typedMethods(found)[0] ?? 'manual');
    setRefused(NO_TEXTS);
  };
  const handleMethod = (next: typeof method) => {
    setMethod(next);
    setConditions({});
    setMissing([]);
  };
  useEffect(() => {
    if (missing.length > 0) summary.current?.focus();
  }, [missing]);
  const handleClose = () => {
    if (typedIds.length > 0 && !isLeaving) setIsLeaving(true);
    else onClose();
  };
  const missingAt = (name: string) => missing.find((entry) => entry.name === name)?.message;
  const handleSave = async () => {
    setNotice(undefined);
    const open = missingConditions(method, { ...conditions, instrument });
    setMissing(open);
    if (open.length > 0) return;
    if ('message' in spread) return setNotice({ what: 'The uncertainty cannot be read.', todo: spread.message });
    const common = { quantity, method, instrument: instrument.trim(), methodDetail: conditions, uncertainty: spread.value };
    const reason = replaces && replaceReason.trim() !== '' ? replaceReason.trim() : undefined;
    const sent = measurementsOf(grids.typed, { ...common, replaceReason: reason }, { earlier: inspection.measurements, locale });
    if (sent.length === 0)
      return setNotice({ what: 'There is nothing to save.', todo: 'Type a value for at least one cell, or paste a block.' });
    setIsBusy(true);
    try {
      await addMeasurements(couponId, sent, key.current());
      key.renew();
      onSaved(sent.length);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      if (error.status !== 0 && error.status < 500) key.renew();
      const { cells: bad, others } = refusedCells(error.errors, sent);
      setRefused(bad);
      setNotice({
        what: error.status === 0 ? 'No answer came from the server.' : `${error.title}.`,
        todo: todoOf(error, others, bad.size),
      });
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      title="Enter measurements"
      width="broad"
      onClose={handleClose}
      actions={
        <>
          <Button disabled={grids.undo === undefined} onClick={() => grids.undo?.()}>
            Undo
          </Button>
          <Button kind="primary" isBusy={isBusy} onClick={() => void handleSave()}>
            Save {typedIds.length - unreadableCount(problems, typedIds)} values
          </Button>
        </>
      }
    >
      {isLeaving && (
        <ProblemNotice
          what="The values that you typed are not saved."
          todo="Save them, or close and lose them."
          actions={
            <>
              <Button onClick={() => setIsLeaving(false)}>Keep typing</Button>
              <Button onClick={onClose}>Close without saving</Button>
            </>
          }
        />
      )}
      <ErrorSummary ref={summary} entries={missing} />
      {notice !== undefined && <ProblemNotice what={notice.what} safe="What you typed is still here." todo={notice.todo} />}
      <Box display="grid" gridTemplateColumns={{ base: '1fr', sm: 'repeat(3, minmax(0, 1fr))' }} gap="3" my="3">
        <SelectField
          name="quantity"
          label="What was measured"
          value={quantity}
          onChange={({ target }) => handleQuantity(target.value)}
          options={MEASUREMENT_QUANTITIES.map((code) => ({ value: code, label: QUANTITIES[code].label }))}
        />
        <SelectField
          name="method"
          label="How"
          value={method}
          onChange={({ target }) => handleMethod(typedMethods(quantity).find((code) => code === target.value) ?? method)}
          options={typedMethods(quantity).map((code) => ({ value: code, label: METHOD_LABELS[code] }))}
        />
        {method !== 'manual' && (
          <TextField
            name="instrument"
            label="Instrument"
            maxLength={120}
            error={missingAt('instrument')}
            value={instrument}
            onChange={({ target }) => setInstrument(target.value)}
          />
        )}
        <MeasureConditions method={method} conditions={conditions} onChange={setConditions} errorAt={missingAt} locale={locale} />
        <NumberField
          name="uncertainty"
          label="Uncertainty"
          isOptional
          {...(unit === '1' ? {} : { unit })}
          error={'message' in spread ? spread.message : undefined}
          value={uncertainty}
          onChange={({ target }) => setUncertainty(target.value)}
        />
      </Box>
      <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" mb="2">
        {label}
        {unit === '1' ? '' : `, ${unit}`}. A block copied from a spreadsheet goes in at the field it is pasted into. Pale numbers are stored
        already.
      </chakra.p>
      <MeasureGrid
        grid={grid}
        cells={cells}
        typed={grids.typed}
        problems={problems}
        earlier={earlier}
        unit={unit === '1' ? '' : unit}
        onType={(cellId, text) => {
          grids.type(cellId, text);
          setRefused((before) => without(before, cellId));
        }}
        onPaste={(texts, outside) => {
          grids.paste(texts);
          setNotice(
            outside === 0
              ? undefined
              : {
                  what: `${outside} pasted values lie outside the plate.`,
                  todo: 'The others are in their cells. Undo takes the whole paste back.',
                },
          );
        }}
      />
      <BadCells cells={cells} problems={problems} />
      {replaces && (
        <Box mt="3">
          <TextField
            name="replace-reason"
            label="Why the new values take the place of stored ones"
            isOptional
            help="Left empty, they stand beside the stored ones as a repeat, and the newest counts."
            maxLength={500}
            value={replaceReason}
            onChange={({ target }) => setReplaceReason(target.value)}
          />
        </Box>
      )}
    </Dialog>
  );
}

function BadCells({ cells, problems }: { cells: readonly CouponCell[]; problems: Texts }) {
  const bad = cells.flatMap(({ id, address }) => {
    const message = problems.get(id);
    return message === undefined ? [] : [{ address, message }];
  });
  if (bad.length === 0) return null;
  return (
    <Flex as="ul" direction="column" gap="1" mt="2" fontSize="sm" lineHeight="sm" color="oxide.fg" role="status">
      {bad.map(({ address, message }) => (
        <li key={address}>
          {address}: {message}
        </li>
      ))}
    </Flex>
  );
}

/** Texts of the cells; a paste is one change, and Undo takes it back as a whole. */
function useTexts() {
  const [typed, setTyped] = useState(NO_TEXTS);
  const [past, setPast] = useState<readonly Texts[]>([]);
  const last = past.at(-1);
  return {
    typed,
    type: (cellId: string, text: string) => setTyped((before) => new Map(before).set(cellId, text)),
    paste: (texts: Texts) => {
      setPast((steps) => [...steps, typed]);
      setTyped(new Map([...typed, ...texts]));
    },
    undo:
      last === undefined
        ? undefined
        : () => {
            setTyped(last);
            setPast((steps) => steps.slice(0, -1));
          },
  };
}

function unreadable(typed: Texts, read: (text: string) => object): [string, string][] {
  return [...typed].flatMap(([id, text]): [string, string][] => {
    if (text.trim() === '') return [];
    const result = read(text);
    return 'message' in result ? [[id, String(result.message)]] : [];
  });
}

const unreadableCount = (problems: Texts, ids: readonly string[]) => ids.filter((id) => problems.has(id)).length;

function without(texts: Texts, id: string): Texts {
  const next = new Map(texts);
  next.delete(id);
  return next;
}

function todoOf({ status, detail }: ProblemError, others: readonly string[], badCount: number): string {
  if (status === 0) return 'Save again when the connection is back: it is carried out once.';
  if (others.length > 0) return others.join(' ');
  return badCount > 0 ? 'Mend the marked cells, then save again. Nothing was stored yet.' : detail;
}
