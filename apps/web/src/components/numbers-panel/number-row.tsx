import { type KeyboardEvent, memo, useEffect, useId, useRef } from 'react';
import { CautionIcon } from '../icons';
import { TextLink } from '../text-link';
import { isSameNumber, type ShownNumber } from './shown-number';

type NumberRowProps = { id: string; number: ShownNumber; isOpen: boolean; onToggle: (id: string) => void };

/** One number with its unit; pressed, it says where it comes from. */
function NumberRow({ id, number, isOpen, onToggle }: NumberRowProps) {
  const sheetId = useId();
  const button = useRef<HTMLButtonElement>(null);
  const { label, text, unit, lookAt } = number;
  const handleKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || !isOpen) return;
    event.stopPropagation();
    onToggle(id);
    button.current?.focus();
  };
  return (
    // The keys are those of the button and of the link in its sheet.
    <li className="row" onKeyDown={handleKeyDown} {...(isOpen ? { 'data-number-open': '' } : {})}>
      <button type="button" ref={button} aria-expanded={isOpen} aria-controls={sheetId} onClick={() => onToggle(id)}>
        <span className="label">{label}</span>{' '}
        <span className="value">
          {lookAt.length > 0 && (
            <span className="flag">
              <CautionIcon size={14} />
              <span className="spoken">look at this: </span>
            </span>
          )}
          {text === undefined ? <span className="missing">not known</span> : <b>{text}</b>}
          {text !== undefined && unit !== '' && <span className="unit">{`\u00A0${unit}`}</span>}
        </span>
      </button>
      <div id={sheetId} hidden={!isOpen} className="sheet">
        {isOpen && <Sheet number={number} />}
      </div>
    </li>
  );
}

export const MemoNumberRow = memo(
  NumberRow,
  (one, other) =>
    one.id === other.id && one.isOpen === other.isOpen && one.onToggle === other.onToggle && isSameNumber(one.number, other.number),
);

function Sheet({ number: { text, reason, formula, inputs, source, more, lookAt, label } }: { number: ShownNumber }) {
  const sheet = useRef<HTMLDivElement>(null);
  useEffect(() => {
    // it may answer with a promise, which an effect must not hand on
    sheet.current?.scrollIntoView?.({ block: 'nearest' });
  }, []);
  return (
    <div ref={sheet}>
      {text === undefined && <p>Not known because {reason}.</p>}
      <p>{formula}</p>
      {inputs !== '' && <p>{inputs}</p>}
      {source !== '' && <p>Source: {source}</p>}
      {lookAt.map((look) => (
        <p key={look}>{look}</p>
      ))}
      {more !== undefined && (
        <p>
          <TextLink to={more}>
            More about this<span className="spoken">: {label}</span>
          </TextLink>
        </p>
      )}
    </div>
  );
}
