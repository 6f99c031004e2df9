import { useEffect, useMemo, useRef, useState } from 'react';
import {
  NavigationType,
  Outlet,
  redirect,
  useLocation,
  useNavigation,
  useNavigationType,
  type LoaderFunction,
} from 'react-router-dom';
import { queryClient } from '../shared/api/query-client';
import { sessionQuery, usePerson, useSession } from '../shared/api/session';
import { Toasts } from '../shared/feedback/toasts';
import { SliceOfPageProvider } from '../shared/page/slice-of-page';
import { useNarrow } from '../shared/theme/colour-mode';
import { menuOf, sectionsOf } from './sections';
import { StrataPane, StrataStripPane } from './strata-pane';
import { NarrowTopBar, TopBar } from './top-bar';
import { useSectionKeys } from './use-section-keys';
import './frame.css';

const openKey = 'siltlight-column';

/** Pages inside the frame need a signed-in person; the way back is kept in the address. */
export const frameLoader: LoaderFunction = async ({ request }) => {
  const session = await queryClient.ensureQueryData(sessionQuery);
  if (session.person) return null;
  const { pathname, search } = new URL(request.url);
  return redirect(pathname === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(pathname + search)}`);
};

/** Column, top bar and page. */
export function Frame() {
  const person = usePerson();
  const { demo } = useSession();
  const narrow = useNarrow();
  const [open, setOpen] = useState(() => localStorage.getItem(openKey) === 'open');
  const sections = useMemo(() => sectionsOf(person), [person]);
  useSectionKeys(useMemo(() => [...sections, ...menuOf(person, demo)], [sections, person, demo]));
  const main = usePageFocus();
  const waiting = useNavigation().state !== 'idle';
  const toggle = () => {
    localStorage.setItem(openKey, open ? 'closed' : 'open');
    setOpen(!open);
  };
  return (
    <SliceOfPageProvider>
      <div className={narrow ? 'frame narrow' : open ? 'frame open' : 'frame'}>
        <a href="#page" className="frame-skip">
          Skip to the page
        </a>
        {narrow ? (
          <>
            <NarrowTopBar sections={sections} />
            <StrataStripPane />
          </>
        ) : (
          <>
            <StrataPane open={open} onToggle={toggle} />
            <TopBar sections={sections} />
          </>
        )}
        <main
          id="page"
          ref={main}
          tabIndex={-1}
          className={waiting ? 'frame-page waiting' : 'frame-page'}
          aria-busy={waiting}
        >
          <Outlet />
        </main>
      </div>
      <Toasts />
    </SliceOfPageProvider>
  );
}

/** After a navigation the title of the new page takes the focus and the page starts at its top. */
function usePageFocus() {
  const main = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  const how = useNavigationType();
  const first = useRef(true);
  useEffect(() => {
    if (first.current) {
      first.current = false;
      return;
    }
    // A dialog with an address of its own keeps the focus; taken from it, it would be hidden from readers.
    if (document.querySelector('[aria-modal="true"]')) return;
    if (how !== NavigationType.Pop && main.current) main.current.scrollTop = 0;
    (main.current?.querySelector('h1') ?? main.current)?.focus({ preventScroll: true });
  }, [pathname, how]);
  return main;
}
