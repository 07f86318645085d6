import { useState } from 'react';
import { useNavigate } from 'react-router';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { DraftIcon } from '../../../components/icons';
import { paths } from '../../../lib/paths';
import { startDraft } from '../recipes.api';

const LABELS = { reason: 'Reason for the change' };

export type ProposeChangeButtonProps = {
  recipe: { id: string; code: string };
  /** Revision to copy; absent: the approved one, else the newest. */
  basedOnId?: string;
  kind?: 'primary' | 'plain';
  label?: string;
};

/** A draft is begun with its reason, so that a press by mistake leaves nothing behind. */
export function ProposeChangeButton({ recipe, basedOnId, kind = 'primary', label = 'Propose a change' }: ProposeChangeButtonProps) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button kind={kind} icon={<DraftIcon />} onClick={() => setIsOpen(true)}>
        {label}
      </Button>
      {isOpen && <ProposeDialog recipe={recipe} basedOnId={basedOnId} onClose={() => setIsOpen(false)} />}
    </>
  );
}

type ProposeDialogProps = Pick<ProposeChangeButtonProps, 'recipe'> & { basedOnId: string | undefined; onClose: () => void };

function ProposeDialog({ recipe, basedOnId, onClose }: ProposeDialogProps) {
  const navigate = useNavigate();
  const form = useSummaryForm({ defaultValues: { reason: '' } });
  const { errors, isSubmitting } = form.formState;
  return (
    <Dialog title={`Propose a change to ${recipe.code}`} onClose={onClose}>
      <Form
        form={form}
        labels={LABELS}
        onSubmit={async ({ reason }, { idempotencyKey }) => {
          const draft = await startDraft(recipe.id, { basedOnRevisionId: basedOnId, reason: reason.trim() }, idempotencyKey);
          await navigate(paths.recipeRevision(recipe.code, draft.id));
        }}
      >
        <TextAreaField
          label={LABELS.reason}
          help="A draft copies the setting; what was signed stays as it is. The signer reads the reason first, and you can change it until then."
          error={errors.reason?.message}
          {...form.register('reason', { validate: (text) => text.trim() !== '' || 'Say why it should change.' })}
        />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          Begin the draft
        </Button>
      </Form>
    </Dialog>
  );
}
