import { memo, type ReactNode, useCallback, useDeferredValue, useEffect, useState } from 'react';
import { CautionIcon } from '../icons';
import { MemoNumberRow } from './number-row';
import { NUMBERS_CLASS } from './numbers-style';
import { type NumbersGroup, reasonsOf, type ShownNumber } from './shown-number';

export type NumbersPanelProps = { label: string; groups: readonly NumbersGroup[] };

/**
 * Numbers that follow from a setting. A row opens to its formula, inputs and source in a sheet that lies over the rows below, so that
 * nothing moves; what to look at and why a number is missing stand under the rows, so that a value may come and go while somebody types.
 */
export function NumbersPanel({ label, groups }: NumbersPanelProps) {
  const [openKey, setOpenKey] = useState<string>();
  const toggle = useCallback((key: string) => setOpenKey((open) => (open === key ? undefined : key)), []);
  useEffect(() => {
    if (openKey === undefined) return undefined;
    const handlePress = ({ target }: PointerEvent) => {
      if (!(target instanceof Element) || target.closest('[data-number-open]') === null) setOpenKey(undefined);
    };
    document.addEventListener('pointerdown', handlePress);
    return () => document.removeEventListener('pointerdown', handlePress);
  }, [openKey]);
  return (
    <section aria-label={label} className={NUMBERS_CLASS}>
      {groups.map((group) => (
        <Group key={group.key} group={group} hasTitle={groups.length > 1} openKey={openKey} onToggle={toggle} />
      ))}
    </section>
  );
}

type GroupProps = { group: NumbersGroup; hasTitle: boolean; openKey: string | undefined; onToggle: (key: string) => void };

function Group({ group, hasTitle, openKey, onToggle }: GroupProps) {
  const { key, title, numbers, remarks } = group;
  const meant = numbers.filter(({ isRuledOut }) => !isRuledOut);
  const rows = { group: key, openKey, onToggle };
  // while somebody types, the numbers that stand first are drawn first
  const settled = useDeferredValue(group);
  return (
    <div>
      {hasTitle && <h4>{title}</h4>}
      <Rows {...rows} numbers={meant.filter(({ isFirst }) => isFirst)} />
      <Notes numbers={meant} remarks={remarks} />
      <Rest group={settled} openKey={openKey} onToggle={onToggle} />
    </div>
  );
}

const Rest = memo(RestOfNumbers);

function RestOfNumbers({ group: { key, numbers }, openKey, onToggle }: Omit<GroupProps, 'hasTitle'>) {
  const rest = numbers.filter(({ isRuledOut, isFirst }) => !isRuledOut && !isFirst);
  if (rest.length === 0) return null;
  return (
    <details>
      <summary>{rest.length} more numbers</summary>
      <Rows group={key} openKey={openKey} onToggle={onToggle} numbers={rest} />
      {reasonsOf(numbers.filter(({ isRuledOut }) => isRuledOut)).map(([reason, labels]) => (
        <p key={reason} className="aside">
          Has none of {listed(labels)}: {reason}.
        </p>
      ))}
    </details>
  );
}

type RowsProps = { group: string; openKey: string | undefined; onToggle: (key: string) => void; numbers: readonly ShownNumber[] };

function Rows({ group, openKey, onToggle, numbers }: RowsProps) {
  return (
    <ul>
      {numbers.map((number) => {
        const id = `${group} ${number.key}`;
        return <MemoNumberRow key={number.key} id={id} number={number} isOpen={openKey === id} onToggle={onToggle} />;
      })}
    </ul>
  );
}

/** What needs a second look, then what is not known and why. */
function Notes({ numbers, remarks }: { numbers: readonly ShownNumber[]; remarks: readonly string[] }) {
  const looks = numbers.flatMap(({ key, label, lookAt }) => lookAt.map((text) => ({ key: key + text, label, text })));
  const reasons = reasonsOf(numbers);
  if (looks.length + remarks.length + reasons.length === 0) return null;
  return (
    <ul className="notes">
      {remarks.map((remark) => (
        <Look key={remark}>{remark}</Look>
      ))}
      {looks.map(({ key, label, text }) => (
        <Look key={key}>
          <b>{label}:</b> {text}
        </Look>
      ))}
      {reasons.map(([reason, labels]) => (
        <li key={reason}>
          {sentenceOf(labels)} {labels.length === 1 ? 'is' : 'are'} not known because {reason}.
        </li>
      ))}
    </ul>
  );
}

function Look({ children }: { children: ReactNode }) {
  return (
    <li className="look">
      <CautionIcon size={16} />
      <span>{children}</span>
    </li>
  );
}

const lower = (label: string) =>
  /^[A-Z][a-z]/.test(label) && !/^(Rayleigh|Gaussian)/.test(label) ? label.charAt(0).toLowerCase() + label.slice(1) : label;
const listed = (labels: readonly string[]) => labels.map(lower).join(', ');
const sentenceOf = ([first = '', ...others]: readonly string[]) => [first, ...others.map(lower)].join(', ');
