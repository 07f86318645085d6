import { chakra } from '@chakra-ui/react';
import { type FormEvent, type ReactNode, useCallback, useEffect, useRef, useState } from 'react';
import {
  type FieldErrors,
  type FieldPath,
  type FieldValues,
  type UseFormProps,
  type UseFormReturn,
  useForm,
  useFormState,
} from 'react-hook-form';
import { ProblemError } from '../lib/api';
import { showFieldProblems } from '../lib/form-problem';
import { useIdempotencyKey } from '../lib/idempotency-key';
import { ErrorSummary, type SummaryEntry } from './error-summary';
import { ProblemNotice } from './problem-notice';

/** react-hook-form as every form here uses it: after a refused submit the summary takes the focus, not the first field. */
export function useSummaryForm<T extends FieldValues>(options: UseFormProps<T>): UseFormReturn<T> {
  return useForm<T>({ mode: 'onSubmit', reValidateMode: 'onChange', shouldFocusError: false, ...options });
}

export type FormProps<T extends FieldValues> = {
  form: UseFormReturn<T>;
  /** Label of every field by its name: for the summary, and to find the fields that a refusal names. */
  labels: Readonly<Record<string, string>>;
  /** Sends the values; a thrown ProblemError is shown and everything typed stays. */
  onSubmit: (values: T, submit: { idempotencyKey: string }) => Promise<unknown>;
  /** Words for a refusal that no field can show; undefined falls back to the server's own words. */
  explain?: (problem: ProblemError) => { what: string; todo?: ReactNode } | undefined;
  /** Words for a submit that got no answer, where the usual ones are too mild. */
  unanswered?: UnansweredWords;
  children: ReactNode;
};

export type UnansweredWords = { what: string; safe: string; todo: string };

const UNANSWERED: UnansweredWords = {
  what: 'No answer came from the server.',
  safe: 'What you typed is still here. Whether it was saved is not known.',
  todo: 'Send it again when the connection is back: it is carried out once.',
};

export function Form<T extends FieldValues>({ form, labels, onSubmit, explain, unanswered = UNANSWERED, children }: FormProps<T>) {
  const [problem, setProblem] = useState<ProblemError>();
  // a form that is not drawn again by its page still shows its own messages
  const { errors, isSubmitted } = useFormState({ control: form.control });
  const { summary, notice, focusNext } = useRefusalFocus();
  const idempotencyKey = useIdempotencyKey();
  // Read at every render: the form works out only what it was asked for before.
  const { isDirty } = form.formState;
  // The names of `labels` are the form's own fields.
  const names = Object.keys(labels) as FieldPath<T>[];

  const submit = async (values: T) => {
    setProblem(undefined);
    try {
      await onSubmit(values, { idempotencyKey: idempotencyKey.current() });
      idempotencyKey.renew();
    } catch (error) {
      if (error instanceof ProblemError && isAnswered(error)) idempotencyKey.renew();
      const rest = showFieldProblems(error, form.setError, names);
      setProblem(rest);
      focusNext(rest === undefined ? 'summary' : 'notice');
    }
  };
  const handleSubmit = (event: FormEvent) => void form.handleSubmit(submit, () => focusNext('summary'))(event);

  return (
    <chakra.form noValidate onSubmit={handleSubmit} display="grid" gap="4" maxW="form">
      <ErrorSummary ref={summary} entries={isSubmitted ? summaryEntries(errors, labels) : []} />
      {problem !== undefined && (
        <div ref={notice} tabIndex={-1}>
          <FormProblem problem={problem} explanation={explain?.(problem)} unanswered={unanswered} isTyped={isDirty} />
        </div>
      )}
      {children}
    </chakra.form>
  );
}

/** Moves the focus to the summary or the notice as soon as it is drawn, at every refusal anew. */
function useRefusalFocus() {
  const summary = useRef<HTMLDivElement>(null);
  const notice = useRef<HTMLDivElement>(null);
  const pending = useRef<'summary' | 'notice'>(undefined);
  // Without dependencies: the errors arrive a render or two after the refusal is known.
  useEffect(() => {
    if (pending.current === undefined) return;
    const target = (pending.current === 'summary' ? summary : notice).current;
    if (target === null) return;
    target.focus();
    pending.current = undefined;
  });
  const focusNext = useCallback((target: 'summary' | 'notice') => {
    pending.current = target;
  }, []);
  return { summary, notice, focusNext };
}

type FormProblemProps = {
  problem: ProblemError;
  explanation: { what: string; todo?: ReactNode } | undefined;
  unanswered: UnansweredWords;
  /** Something was typed or chosen that could be lost. */
  isTyped: boolean;
};

function FormProblem({ problem, explanation, unanswered, isTyped }: FormProblemProps) {
  if (problem.status === 0) return <ProblemNotice {...unanswered} />;
  const { what, todo } = explanation ?? { what: `${problem.title}.`, todo: problem.detail };
  return <ProblemNotice what={what} safe={isTyped ? 'What you typed is still here.' : 'Nothing was changed.'} todo={todo} />;
}

function summaryEntries(errors: FieldErrors, labels: Readonly<Record<string, string>>): SummaryEntry[] {
  return Object.entries(labels).flatMap(([name, label]) => {
    const message = messageAt(errors, name);
    return message === undefined ? [] : [{ name, label, message }];
  });
}

/** Message of the field with a dotted name. */
export function messageAt(errors: FieldErrors, name: string): string | undefined {
  let node: unknown = errors;
  for (const step of name.split('.')) node = isRecord(node) ? node[step] : undefined;
  return isRecord(node) && typeof node.message === 'string' && node.message !== '' ? node.message : undefined;
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

/** The same key goes out again while the first request may still be at work. */
function isAnswered({ status, code }: ProblemError): boolean {
  return status !== 0 && status < 500 && code !== 'request-in-flight';
}
