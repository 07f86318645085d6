import { chakra } from '@chakra-ui/react';
import type { Panel } from '@proofplate/recipe-model';
import { type ReactNode, useDeferredValue, useEffect, useRef, useState } from 'react';
import { useWatch } from 'react-hook-form';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { useSummaryForm } from '../../../components/form';
import { ProblemNotice } from '../../../components/problem-notice';
import { SkeletonBlock, SkeletonForm } from '../../../components/skeletons';
import { ProblemError } from '../../../lib/api';
import { readNumber } from '../../../lib/read-number';
import { type Coupon, type CouponPreview, planCoupon, useGroundChoices, useLensChoices, useMachineChoices } from '../coupons.api';
import { planBody } from './plan-body';
import { PlanForm } from './plan-form';
import { PlanNumbers } from './plan-numbers';
import { PlanFacts, PlanPreview } from './plan-preview';
import { factorsFor, type PlanValues } from './plan-values';
import type { CellPlace } from './planned-setting';
import { ReadCautions } from './read-cautions';
import { type LivePlan, useLivePlan } from './use-plan';

export type PlanCouponProps = { initial: PlanValues; locale: string; onPlanned: (coupon: Coupon) => void };

/** Form at the left, consequence at the right: dose in every cell, what to look at, time and plate. */
export function PlanCoupon({ initial, locale, onPlanned }: PlanCouponProps) {
  const form = useSummaryForm<PlanValues>({ defaultValues: initial });
  const frame = useRef<HTMLDivElement>(null);
  const [machineId, cellMm, gapMm] = useWatch({ control: form.control, name: ['machineId', 'cellMm', 'gapMm'] });
  const machines = useMachineChoices().data?.items;
  const lenses = useLensChoices(machineId).data?.items ?? [];
  const { materials, finishes, effects } = useGroundChoices();
  const lensId = useWatch({ control: form.control, name: 'lensId' });
  const machine = machines?.find(({ id }) => id === machineId);
  const panel = machine?.profile.panel;
  const live = useLivePlan(form, panel, locale);
  const [chosen, setChosen] = useState<string>();
  const [readCautionIds, setReadCautionIds] = useState<readonly string[]>([]);

  useEffect(() => {
    if (panel === undefined) return;
    const factors = factorsFor(panel, form.getValues());
    if (form.getValues('columns.parameter') !== factors.columns) form.setValue('columns.parameter', factors.columns);
    if (form.getValues('rows.parameter') !== factors.rows && !form.formState.dirtyFields.rows)
      form.setValue('rows.parameter', factors.rows);
  }, [panel, form]);
  useEffect(() => {
    const [only] = lenses;
    const mounted = lenses.find(({ isMounted }) => isMounted) ?? (lenses.length === 1 ? only : undefined);
    if (form.getValues('lensId') === '' && mounted !== undefined) form.setValue('lensId', mounted.lensId);
  }, [lenses, form]);

  const handleSubmit = async (values: PlanValues, { idempotencyKey }: { idempotencyKey: string }) => {
    const read = planBody(values, panel, locale);
    if ('messages' in read) throw unreadable(read.messages);
    onPlanned(await planCoupon({ ...read.body, acknowledgedCautionIds: [...readCautionIds] }, idempotencyKey));
  };
  if (machines === undefined || materials === undefined || finishes === undefined || effects === undefined)
    return <SkeletonForm fields={8} />;
  const sizes = { cellMm: sizeOf(cellMm, locale, 5), gapMm: sizeOf(gapMm, locale, 1.2) };
  return (
    <chakra.div
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '352px minmax(0, 1fr)' }}
      gap={{ base: '6', lg: '8' }}
      alignItems="start"
    >
      <div ref={frame}>
        <PlanForm
          form={form}
          choices={{ machines, lenses, materials, finishes, effects }}
          panel={panel}
          isMachineChosen={machineId !== ''}
          preview={live.preview}
          numbers={
            machine !== undefined && (
              <PlanNumbers
                form={form}
                machine={machine}
                lens={lenses.find((own) => own.lensId === lensId)}
                place={placeOf(live.preview, chosen)}
                doseCaution={live.preview?.doseCaution ?? null}
                cellMm={sizes.cellMm}
                locale={locale}
              />
            )
          }
          onSubmit={handleSubmit}
        />
      </div>
      <chakra.section aria-label="What the plan gives" position={{ lg: 'sticky' }} top={{ lg: '6' }} display="grid" gap="4" minW="0">
        <Consequence live={live} panel={panel} sizes={sizes} chosen={chosen} onChoose={setChosen}>
          <ReadCautions cautions={live.preview?.cautions ?? []} readIds={readCautionIds} onRead={setReadCautionIds} />
        </Consequence>
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
    return (
      <EmptyState kind="none-match" title="The plate appears as soon as the plan can be read">
        {waitsFor.length === 0 ? 'Choose the machine first: its panel says what can be typed.' : waitsFor[0]?.message}
      </EmptyState>
    );
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
  const read = readNumber(text, { what: 'The size', unit: 'mm', least: 0.3, most: 30 }, locale);
  return 'value' in read ? read.value : usual;
}
