import { chakra } from '@chakra-ui/react';
import { type FormEvent, useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { TextField } from '../../../components/field';

const USUAL_REASONS = ['Clamp in the way', 'Scratch on the ground', 'Machine stopped', 'Risk of burning through'];

export type SkipDialogProps = {
  address: string;
  isBusy: boolean;
  problem: string | undefined;
  onClose: () => void;
  onSkip: (reason: string) => void;
};

/** A skipped cell needs a reason: one tap for the usual ones. */
export function SkipDialog({ address, isBusy, problem, onClose, onSkip }: SkipDialogProps) {
  const [reason, setReason] = useState('');
  const [isMissing, setIsMissing] = useState(false);
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    if (reason.trim() === '') setIsMissing(true);
    else onSkip(reason.trim());
  };
  return (
    <Dialog title={`Skip ${address}`} onClose={onClose}>
      <chakra.form noValidate onSubmit={handleSubmit} display="grid" gap="3">
        <chakra.div display="grid" gap="2">
          {USUAL_REASONS.map((usual) => (
            <Button key={usual} size="glove" shape="wide" isBusy={isBusy} onClick={() => onSkip(usual)}>
              {usual}
            </Button>
          ))}
        </chakra.div>
        <TextField
          size="glove"
          name="reason"
          label="Another reason"
          value={reason}
          onChange={(event) => setReason(event.currentTarget.value)}
          error={isMissing && reason.trim() === '' ? 'Say why, in a word or two.' : undefined}
        />
        {problem !== undefined && (
          <chakra.p role="alert" color="oxide.fg">
            {problem}
          </chakra.p>
        )}
        <Button kind="primary" size="primaryAct" shape="wide" type="submit" isBusy={isBusy}>
          Skip the cell
        </Button>
      </chakra.form>
    </Dialog>
  );
}
