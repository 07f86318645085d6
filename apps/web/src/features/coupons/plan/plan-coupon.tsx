import { chakra } from '@chakra-ui/react';
import type { Panel } from '@proofplate/recipe-model';
import { type ReactNode, useCallback, useDeferredValue, useEffect, useMemo, useRef, useState } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { messageAt, useSummaryForm } from '../../../components/form';
import { ProblemNotice } from '../../../components/problem-notice';
import { SkeletonBlock, SkeletonForm } from '../../../components/skeletons';
import { ProblemError } from '../../../lib/api';
import { asSentence } from '../../../lib/format';
import { readNumber } from '../../../lib/read-number';
import { headOverheadsOf } from '../../../lib/time-words';
import { useSame } from '../../../lib/use-same';
import {
  type Coupon,
  type CouponPreview,
  type Machine,
  type MachineLens,
  planCoupon,
  useCautionsFor,
  useGroundChoices,
  useLensChoices,
  useMachineChoices,
} from '../coupons.api';
import type { GroundChoices } from './ground-fields';
import { keptPlan } from './kept-plan';
import { planBody } from './plan-body';
import { PlanForm } from './plan-form';
import { labelsOf } from './plan-labels';
import { PlanNumbers } from './plan-numbers';
import { PlanFacts, PlanPreview } from './plan-preview';
import type { PlanValues } from './plan-values';
import type { CellPlace } from './planned-setting';
import { ReadCautions } from './read-cautions';
import { RestoredPlan } from './restored-plan';
import { useKeptPlan } from './use-kept-plan';
import { groundMessages, type LivePlan, useLivePlan } from './use-plan';
import { useUsualChoices } from './use-usual-choices';

export type PlanCouponProps = {
  initial: PlanValues;
  /** Under which what is typed is kept until it is saved. */
  keepAs: string;
  locale: string;
  onPlanned: (coupon: Coupon) => void;
};

/** Form at the left, consequence at the right: dose in every cell, what to look at, time and plate. */
export function PlanCoupon({ initial, keepAs, locale, onPlanned }: PlanCouponProps) {
  const [begun] = useState(() => keptPlan(keepAs));
  const form = useSummaryForm<PlanValues>({ defaultValues: begun ?? initial });
  const kept = useKeptPlan(form, keepAs, { initial, wasKept: begun !== undefined });
  const frame = useRef<HTMLDivElement>(null);
  const [machineId, lensId, cellMm, gapMm, readCautionIds] = useWatch({
    control: form.control,
    name: ['machineId', 'lensId', 'cellMm', 'gapMm', 'acknowledgedCautionIds'],
  });
  const [materialId, finishId, effectId] = useWatch({ control: form.control, name: ['materialId', 'finishId', 'effectId'] });
  const machines = useMachineChoices().data?.items;
  const lenses = useLensChoices(machineId).data?.items ?? NONE;
  const { materials, finishes, effects } = useGroundChoices();
  const machine = machines?.find(({ id }) => id === machineId);
  const panel = machine?.profile.panel;
  const never = useSame(useCautionsFor({ materialId, finishId, effectId, machineId }).filter(({ level }) => level === 'never'));
  const [forbidding] = never;
  const live = useLivePlan(form, { machine, never: forbidding, locale });
  const [chosen, setChosen] = useState<string>();
  useUsualChoices(form, panel, lenses);

  const handleSubmit = useLatest(async (values: PlanValues, { idempotencyKey }: { idempotencyKey: string }) => {
    const read = planBody(values, machine?.profile, locale);
    const ground = groundMessages(forbidding, live.preview?.cautions, values);
    if (forbidding !== undefined) throw unreadable(ground);
    if ('messages' in read || ground.length > 0) throw unreadable([...('messages' in read ? read.messages : []), ...ground]);
    const coupon = await planCoupon({ ...read.body, acknowledgedCautionIds: values.acknowledgedCautionIds }, idempotencyKey);
    kept.forget();
    onPlanned(coupon);
  });
  const numbers = usePlanNumbers(form, live.preview, {
    machine,
    lens: lenses.find((own) => own.lensId === lensId),
    chosen,
    cellMm,
    locale,
  });
  const choices = useMemo(
    () => choicesOf({ machines, lenses, materials, finishes, effects }),
    [machines, lenses, materials, finishes, effects],
  );
  const [rowFactor, columnFactor] = [useSame(live.preview?.rowFactor), useSame(live.preview?.columnFactor)];
  if (choices === undefined) return <SkeletonForm fields={8} />;
  const sizes = { cellMm: sizeOf(cellMm, locale, 5), gapMm: sizeOf(gapMm, locale, 1.2) };
  return (
    <chakra.div
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '352px minmax(0, 1fr)' }}
      gap={{ base: '6', lg: '8' }}
      alignItems="start"
    >
      <chakra.div ref={frame} display="grid" gap="4">
        {kept.isRestored && <RestoredPlan onStartAfresh={kept.startAfresh} />}
        <PlanForm
          form={form}
          choices={choices}
          panel={panel}
          isMachineChosen={machineId !== ''}
          never={never}
          rowFactor={rowFactor}
          columnFactor={columnFactor}
          numbers={numbers}
          onSubmit={handleSubmit}
        />
      </chakra.div>
      <chakra.section aria-label="What the plan gives" position={{ lg: 'sticky' }} top={{ lg: '6' }} display="grid" gap="4" minW="0">
        {forbidding === undefined ? (
          <Consequence live={live} panel={panel} sizes={sizes} chosen={chosen} onChoose={setChosen}>
            <ReadCautions
              cautions={live.preview?.cautions ?? []}
              readIds={readCautionIds}
              onRead={(ids) => {
                form.setValue('acknowledgedCautionIds', ids, { shouldDirty: true });
                form.clearErrors('acknowledgedCautionIds');
              }}
              error={messageAt(form.formState.errors, 'acknowledgedCautionIds')}
            />
          </Consequence>
        ) : (
          <EmptyState kind="none-match" title="There is nothing to plan">
            {asSentence(forbidding.subject)} Choose another material; what you typed is still here.
          </EmptyState>
        )}
        <ActBar>
          <Button
            kind="primary"
            size="touch"
            isBusy={form.formState.isSubmitting}
            onClick={() => frame.current?.querySelector('form')?.requestSubmit()}
          >
            Save the plan
          </Button>
        </ActBar>
      </chakra.section>
    </chakra.div>
  );
}

/** All choices, once all are known. */
function choicesOf({ machines, lenses, materials, finishes, effects }: Partial<GroundChoices> & Pick<GroundChoices, 'lenses'>) {
  if (machines === undefined || materials === undefined || finishes === undefined || effects === undefined) return undefined;
  return { machines, lenses, materials, finishes, effects };
}

type NumbersGround = {
  machine: Machine | undefined;
  lens: MachineLens | undefined;
  chosen: string | undefined;
  cellMm: string;
  locale: string;
};

/** The numbers beside the fields: the same element until what they rest on differs, beside what is typed, which they watch themselves. */
function usePlanNumbers(
  form: UseFormReturn<PlanValues>,
  preview: CouponPreview | undefined,
  { machine, lens, chosen, cellMm, locale }: NumbersGround,
): ReactNode {
  const place = useSame(placeOf(preview, chosen));
  const doseCaution = useSame(preview?.doseCaution ?? null);
  const overheads = useSame(preview === undefined ? undefined : headOverheadsOf(preview.markingTime.overheads));
  return useMemo(
    () =>
      machine !== undefined && (
        <PlanNumbers {...{ form, machine, lens, place, doseCaution, overheads, locale }} cellMm={sizeOf(cellMm, locale, 5)} />
      ),
    [form, machine, lens, place, doseCaution, overheads, cellMm, locale],
  );
}

/** The same function all along, which does what the newest one does. */
function useLatest<Args extends unknown[], Result>(act: (...args: Args) => Result): (...args: Args) => Result {
  const latest = useRef(act);
  useEffect(() => {
    latest.current = act;
  });
  return useCallback((...args: Args) => latest.current(...args), []);
}

const NONE: readonly MachineLens[] = [];

type ConsequenceProps = {
  live: LivePlan;
  panel: Panel | undefined;
  sizes: { cellMm: number; gapMm: number };
  chosen: string | undefined;
  onChoose: (address: string) => void;
  /** Cautions, between the plate and its facts. */
  children: ReactNode;
};

function Consequence({ live, panel, sizes, chosen, onChoose, children }: ConsequenceProps) {
  const { waitsFor, problem, isLoading } = live;
  // a plate of a hundred cells must not stand in the way of the next key
  const preview = useDeferredValue(live.preview);
  if (problem !== undefined && problem.errors.length === 0) return <Refused problem={problem} />;
  if (preview === undefined || panel === undefined) {
    if (isLoading) return <SkeletonBlock height="420px" label="Working the plan out" />;
    return <WaitsFor messages={waitsFor} labels={labelsOf(panel)} />;
  }
  return (
    <>
      <PlanPreview preview={preview} panel={panel} {...sizes} chosen={chosen} onChoose={onChoose} />
      {children}
      <PlanFacts preview={preview}>
        <chakra.span fontSize="sm" color="fg.muted">
          Artwork and cell list follow with the saved plan.
        </chakra.span>
      </PlanFacts>
    </>
  );
}

/** Everything that is still open, at once: whoever fills it in sees the end of it. */
function WaitsFor({ messages, labels }: { messages: LivePlan['waitsFor']; labels: Readonly<Record<string, string>> }) {
  const missing = messages.flatMap(({ name, message, isMissing }) => (isMissing ? [labels[name] ?? message] : []));
  const refused = messages.filter(({ isMissing }) => !isMissing);
  return (
    <EmptyState kind="none-match" title="The plate appears as soon as the plan can be read">
      {messages.length === 0 ? (
        'Choose the machine first: its panel says what can be typed.'
      ) : (
        <>
          {missing.length > 0 && <p>Still open: {missing.join(' · ')}.</p>}
          <ul>
            {refused.map(({ name, message }) => (
              <li key={name}>{message}</li>
            ))}
          </ul>
        </>
      )}
    </EmptyState>
  );
}

/** A `never` caution, or a machine that is gone: nothing is planned, and the words say why and who to ask. */
function Refused({ problem }: { problem: ProblemError }) {
  return (
    <ProblemNotice
      what={problem.status === 0 ? 'The server does not answer, so the plan cannot be worked out.' : `${problem.title}.`}
      safe="Nothing is stored, and what you typed is still here."
      todo={problem.status === 0 ? 'Check the network; the plate comes back by itself when you change something.' : problem.detail}
    />
  );
}

/** What the fields say by themselves, in the form in which the server says it. */
function unreadable(messages: readonly { name: string; message: string }[]): ProblemError {
  const errors = messages.map(({ name, message }) => ({ pointer: `#/${name.replaceAll('.', '/')}`, detail: message }));
  const title = 'Some fields need another look';
  return new ProblemError({ type: '/problems/invalid-fields', code: 'invalid-fields', title, detail: title, status: 422, errors });
}

/** The chosen cell; the first one until somebody chooses, and when the chosen one is no longer on the plate. */
function placeOf(preview: CouponPreview | undefined, chosen: string | undefined): CellPlace {
  const cell = preview?.cells.find(({ address }) => address === chosen);
  return { row: cell?.rowIndex ?? 0, column: cell?.columnIndex ?? 0 };
}

function sizeOf(text: string, locale: string, usual: number): number {
  const read = readNumber(text, { what: 'The size', unit: 'mm', least: 0.3, most: 30, isShopLength: true }, locale);
  return 'value' in read ? read.value : usual;
}
