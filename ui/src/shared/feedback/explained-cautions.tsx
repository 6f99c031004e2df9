import { Popover, PopoverSurface, PopoverTrigger } from '@fluentui/react-components';
import { Warning16Filled } from '@fluentui/react-icons';
import { useState } from 'react';
import { Prose } from '../number/prose';
import { isStrong, reasonOf } from './caution-reasons';
import './feedback.css';
import './explained-cautions.css';

type Line = { code: string; message: string };
type Props = { of: readonly Line[]; label?: string; /** Lines shown before "more". */ first?: number };

/** Cautions in words, directly under their number, each with its reason a press away; the gravest first. */
export function ExplainedCautions({ of, label = 'Cautions', first = 4 }: Props) {
  const [all, setAll] = useState(false);
  if (of.length === 0) return null;
  const unique = of.filter((one, at) => of.findIndex((other) => other.message === one.message) === at);
  const ordered = [...unique].sort((a, b) => Number(isStrong(b.code)) - Number(isStrong(a.code)));
  const shown = all ? ordered : ordered.slice(0, first);
  const rest = ordered.length - shown.length;
  return (
    <>
      <ul className="cautions" aria-label={label}>
        {shown.map((line) => (
          <li key={line.code + line.message} className={isStrong(line.code) ? 'caution strong' : 'caution'}>
            <Warning16Filled aria-hidden />
            <span>
              <Prose text={line.message} /> <Why line={line} />
            </span>
          </li>
        ))}
      </ul>
      {(rest > 0 || all) && ordered.length > first && (
        <button type="button" className="caution-why" aria-expanded={all} onClick={() => setAll(!all)}>
          {all ? 'Fewer cautions' : `${rest} more ${rest === 1 ? 'caution' : 'cautions'}`}
        </button>
      )}
    </>
  );
}

function Why({ line }: { line: Line }) {
  const reason = reasonOf(line.code);
  if (!reason) return null;
  return (
    <Popover withArrow trapFocus positioning="below">
      <PopoverTrigger disableButtonEnhancement>
        <button type="button" className="caution-why" aria-label={`Why: ${line.message}`}>
          Why
        </button>
      </PopoverTrigger>
      <PopoverSurface className="caution-reason" tabIndex={-1} aria-label="Why this caution">
        {reason}
      </PopoverSurface>
    </Popover>
  );
}
