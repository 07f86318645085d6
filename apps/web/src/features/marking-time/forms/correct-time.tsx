import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { SelectField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { messageOf, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { timeText } from '../../../lib/time-words';
import { whereWords } from '../logged-words';
import { correctTime, type LoggedTime } from '../marking-time.api';
import { readClock } from '../read-clock';

const LABELS = { what: 'What is to be done', seconds: 'The right time', reason: 'What was wrong' };
type Values = { what: 'correct' | 'strike'; seconds: string; reason: string };

export type CorrectTimeProps = { machineId: string; time: LoggedTime; onClose: () => void; onDone: (words: string) => void };

/** The first time stays on record; another row takes its place and says why. */
export function CorrectTime({ machineId, time, onClose, onDone }: CorrectTimeProps) {
  const { shop } = useSession();
  const form = useSummaryForm<Values>({ defaultValues: { what: 'correct', seconds: typedNumber(time.seconds, shop.locale), reason: '' } });
  const { errors, isSubmitting } = form.formState;
  const isCorrected = form.watch('what') === 'correct';
  const submit = async ({ what, seconds, reason }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    const read = readClock(seconds, shop.locale);
    const right = what === 'correct' && 'value' in read ? { counts: true, seconds: read.value } : { counts: false };
    await correctTime(machineId, time.id, { ...right, reason: reason.trim() }, idempotencyKey);
    onDone(
      `The time of ${whereWords(time)} is ${what === 'correct' ? 'put right' : 'taken out of the count'}. The first one stays on record.`,
    );
  };
  return (
    <Dialog title={`${whereWords(time)}, ${timeText(time.seconds)}`} onClose={onClose}>
      <Form form={form} labels={LABELS} onSubmit={submit}>
        <SelectField
          label={LABELS.what}
          options={[
            { value: 'correct', label: 'Put the time right' },
            { value: 'strike', label: 'Take it out of the count' },
          ]}
          {...form.register('what')}
        />
        {isCorrected && (
          <TextField
            label={LABELS.seconds}
            autoComplete="off"
            help="Seconds, or minutes and seconds: 130 or 2:10."
            error={errors.seconds?.message}
            {...form.register('seconds', { validate: (text, { what }) => what === 'strike' || messageOf(readClock(text, shop.locale)) })}
          />
        )}
        <TextField
          label={LABELS.reason}
          autoComplete="off"
          error={errors.reason?.message}
          {...form.register('reason', { validate: (text) => text.trim() !== '' || 'Say what was wrong.' })}
        />
        <chakra.div>
          <Button kind="primary" type="submit" isBusy={isSubmitting}>
            {isCorrected ? 'Put it right' : 'Take it out'}
          </Button>
        </chakra.div>
      </Form>
    </Dialog>
  );
}
