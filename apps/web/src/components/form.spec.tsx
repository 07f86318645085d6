import { screen } from '@testing-library/react';
import { ProblemError } from '../lib/api';
import { renderPiece } from '../testing/render';
import { Button } from './button';
import { TextField } from './field';
import { Form, useSummaryForm } from './form';

const refusal = new ProblemError({
  type: 'about:blank',
  title: 'Not permitted',
  status: 403,
  detail: 'Ask a lead.',
  code: 'not-permitted',
  errors: [],
});

function RefusedForm() {
  const form = useSummaryForm({ defaultValues: { note: '' } });
  return (
    <Form form={form} labels={{ note: 'Note' }} onSubmit={() => Promise.reject(refusal)}>
      <TextField label="Note" {...form.register('note')} />
      <Button type="submit">Send</Button>
    </Form>
  );
}

describe('a refused form', () => {
  it('does not speak of typed words where nothing was typed', async () => {
    const { user } = renderPiece(<RefusedForm />);
    await user.click(await screen.findByRole('button', { name: 'Send' }));
    expect(await screen.findByText('Nothing was changed.')).toBeVisible();
    expect(screen.queryByText('What you typed is still here.')).toBeNull();
  });

  it('says that typed words are kept', async () => {
    const { user } = renderPiece(<RefusedForm />);
    await user.type(await screen.findByLabelText('Note'), 'Two slipped');
    await user.click(screen.getByRole('button', { name: 'Send' }));
    expect(await screen.findByText('What you typed is still here.')).toBeVisible();
    expect(screen.getByLabelText('Note')).toHaveValue('Two slipped');
  });
});
