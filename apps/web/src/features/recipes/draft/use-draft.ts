import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { type UseFormReturn, useForm } from 'react-hook-form';
import { ProblemError } from '../../../lib/api';
import { fieldNameFromPointer } from '../../../lib/form-problem';
import { useSession } from '../../../lib/session';
import { revalidate } from '../../../lib/swr';
import { keepAnswer, type Revision, readRevision, saveDraft } from '../recipes.api';
import { type Conflict, changedParts, conflictParts, mergedValues, type PartKey, partsOf, type SavedParts } from './draft-conflict';
import { type DraftValues, draftValues } from './draft-values';
import { type FieldMessages, readDraft } from './read-draft';

const TYPING_PAUSE_MS = 700;
/** Between two tries while nothing answers; a browser that is back online says so at once. */
const RETRY_MS = 4000;

export type SavingState = 'saved' | 'waiting' | 'saving' | 'needs-change' | 'unreachable' | 'refused';

export type Draft = {
  form: UseFormReturn<DraftValues>;
  messages: FieldMessages;
  state: SavingState;
  /** The server's words where it refused for a reason that no field shows. */
  problem: ProblemError | undefined;
  conflict: Conflict | undefined;
  /** Saves what is still open; false where something keeps it from being saved. */
  flush: () => Promise<boolean>;
  /** Another change of the same draft, in turn with the saves. */
  changeWith: (work: (version: number) => Promise<Revision>) => Promise<Revision>;
  resolve: (keepsMine: ReadonlySet<PartKey>) => void;
};

/** A draft that saves itself: what is valid goes to the server a moment after typing, one request after the other. */
export function useDraft(revision: Revision): Draft {
  const { shop } = useSession();
  const { fields } = revision.profile.panel;
  const initial = useMemo(() => draftValues(revision, shop.locale), []);
  const form = useForm<DraftValues>({ defaultValues: initial });
  const version = useRef(revision.version);
  const saved = useRef<SavedParts>(partsOf(readDraft(initial, fields, shop.locale).change));
  const [messages, setMessages] = useState<FieldMessages>({});
  const [state, setState] = useState<SavingState>('saved');
  const [problem, setProblem] = useState<ProblemError>();
  const [conflict, setConflict] = useState<Conflict>();
  const inTurn = useTurns();
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  const meet412 = useCallback(
    async (mine: ReturnType<typeof readDraft>['change']) => {
      const theirs = await readRevision(revision.id);
      const theirChange = readDraft(draftValues(theirs, shop.locale), fields, shop.locale).change;
      setConflict({ theirs, parts: conflictParts({ saved: saved.current, mine, theirs: theirChange, fields }) });
    },
    [revision.id, fields, shop.locale],
  );

  const save = useCallback(async (): Promise<boolean> => {
    const { change, messages: found } = readDraft(form.getValues(), fields, shop.locale);
    const isWhole = Object.keys(found).length === 0;
    const body = changedParts(change, saved.current);
    setMessages(found);
    if (Object.keys(body).length === 0) {
      setState(isWhole ? 'saved' : 'needs-change');
      return isWhole;
    }
    setState('saving');
    try {
      const answer = await saveDraft(revision.id, version.current, body);
      version.current = answer.version;
      saved.current = { ...saved.current, ...partsOf(body) };
      setProblem(undefined);
      setState(isWhole ? 'saved' : 'needs-change');
      return isWhole;
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      const refusal = refusalOf(error);
      if (error.status === 412) await meet412(change);
      if (error.status === 409) void revalidate('/api/revisions', '/api/recipes');
      setMessages({ ...found, ...refusal.messages });
      setProblem(refusal.problem);
      setState(refusal.state);
      return false;
    }
  }, [form, fields, shop.locale, revision.id, meet412]);

  const flush = useCallback(() => {
    clearTimeout(timer.current);
    return inTurn(save);
  }, [inTurn, save]);
  useSaveAfterTyping({ form, timer, flush, isHeld: conflict !== undefined, onTyped: () => setState('waiting') });

  useRetryUntilAnswered(state === 'unreachable', flush);

  const changeWith = useCallback(
    (work: (version: number) => Promise<Revision>) =>
      inTurn(async () => {
        const answer = await work(version.current);
        version.current = answer.version;
        return answer;
      }),
    [inTurn],
  );

  const resolve = (keepsMine: ReadonlySet<PartKey>) => {
    if (conflict === undefined) return;
    const theirs = draftValues(conflict.theirs, shop.locale);
    version.current = conflict.theirs.version;
    saved.current = partsOf(readDraft(theirs, fields, shop.locale).change);
    form.reset(mergedValues(form.getValues(), theirs, keepsMine));
    setConflict(undefined);
    void keepAnswer(conflict.theirs).then(flush);
  };
  return { form, messages, state, problem, conflict, flush, changeWith, resolve };
}

type SaveAfterTyping = {
  form: UseFormReturn<DraftValues>;
  timer: { current: ReturnType<typeof setTimeout> | undefined };
  flush: () => Promise<boolean>;
  /** While two versions stand against each other nothing is saved. */
  isHeld: boolean;
  onTyped: () => void;
};

function useSaveAfterTyping({ form, timer, flush, isHeld, onTyped }: SaveAfterTyping) {
  const typed = useRef(onTyped);
  typed.current = onTyped;
  useEffect(() => {
    if (isHeld) return undefined;
    const { unsubscribe } = form.watch(() => {
      typed.current();
      clearTimeout(timer.current);
      timer.current = setTimeout(() => void flush(), TYPING_PAUSE_MS);
    });
    return unsubscribe;
  }, [form, timer, flush, isHeld]);
  useEffect(() => () => clearTimeout(timer.current), [timer]);
}

/** What was not saved for want of an answer goes out again by itself. */
function useRetryUntilAnswered(isUnanswered: boolean, flush: () => Promise<boolean>) {
  useEffect(() => {
    if (!isUnanswered) return undefined;
    const retry = () => void flush();
    const timer = setInterval(retry, RETRY_MS);
    addEventListener('online', retry);
    return () => {
      clearInterval(timer);
      removeEventListener('online', retry);
    };
  }, [isUnanswered, flush]);
}

/** Runs one piece of work after the other, whatever becomes of the one before. */
function useTurns(): <T>(work: () => Promise<T>) => Promise<T> {
  const last = useRef<Promise<unknown>>(Promise.resolve());
  return useCallback(<T>(work: () => Promise<T>) => {
    const mine = last.current.then(work);
    last.current = mine.catch(() => undefined);
    return mine;
  }, []);
}

function refusalOf(error: ProblemError): { state: SavingState; messages: FieldMessages; problem: ProblemError | undefined } {
  if (error.status === 0) return { state: 'unreachable', messages: {}, problem: undefined };
  if (error.status === 412) return { state: 'refused', messages: {}, problem: undefined };
  const messages = Object.fromEntries(error.errors.map(({ pointer, detail }) => [formName(pointer), detail]));
  return { state: error.errors.length > 0 ? 'needs-change' : 'refused', messages, problem: error };
}

/** The api points into the request; a form field stands for a value with its unit, or for one end of a range. */
function formName(pointer: string): string {
  const name = fieldNameFromPointer(pointer).replace(/\.(?:value|unit)$/, '');
  return /(?:thickness|partDiameter|featureSize)Mm$/.test(name) ? `${name}.to` : name;
}
