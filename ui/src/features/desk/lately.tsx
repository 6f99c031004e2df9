import type { DeskView } from '@siltlight/common/wire/desk';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';

const isToday = (iso: string) => new Date(iso).toDateString() === new Date().toDateString();
const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short' });

/** The last acts from the ledger that concern this person. */
export function Lately({ acts }: { acts: DeskView['lately'] }) {
  return (
    <Figure plain title="Lately, from the ledger">
      {acts.length === 0 && <p className="sl-13 sl-muted">No act yet.</p>}
      <ul className="desk-lately">
        {acts.map((act) => (
          <li key={act.at + act.summary}>
            <time dateTime={act.at}>{(isToday(act.at) ? clock : day).format(new Date(act.at))}</time>
            <span>{act.path ? <Link to={act.path}>{act.summary}</Link> : act.summary}</span>
          </li>
        ))}
      </ul>
    </Figure>
  );
}
