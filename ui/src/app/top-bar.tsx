import { Button, Menu, MenuItem, MenuList, MenuPopover, MenuTrigger } from '@fluentui/react-components';
import { Navigation20Regular, Search20Regular } from '@fluentui/react-icons';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useLocation, useNavigate } from 'react-router-dom';
import { deskQuery } from '../features/desk/queries';
import { useHasRole } from '../shared/api/session';
import { JobsRing } from './jobs-ring';
import { PersonMenu } from './person-menu';
import { SearchBox } from './search-box';
import { isWithin, type Section } from './sections';

/** The word mark, the sections as plain tabs, search, jobs, person. */
export function TopBar({ sections }: { sections: readonly Section[] }) {
  const { pathname } = useLocation();
  const isSteward = useHasRole('steward');
  const waiting = useQuery({ ...deskQuery, enabled: isSteward }).data?.queue.length ?? 0;
  return (
    <header className="frame-top">
      <Link to="/desk" className="frame-word">
        Siltlight
      </Link>
      <nav className="frame-tabs" aria-label="Sections">
        {sections.map((section) => (
          <Link
            key={section.path}
            to={section.path}
            aria-current={isWithin(section, pathname) ? 'page' : undefined}
          >
            {section.title}
            {section.path === '/intake' && waiting > 0 && (
              <span className="frame-count" aria-label={`${waiting} waiting`}>
                {waiting}
              </span>
            )}
          </Link>
        ))}
      </nav>
      <span className="sl-grow" />
      <SearchBox />
      <JobsRing />
      <PersonMenu />
    </header>
  );
}

/** The same on a narrow screen: sections behind a button, the current one named beside the word mark. */
export function NarrowTopBar({ sections }: { sections: readonly Section[] }) {
  const { pathname } = useLocation();
  const navigate = useNavigate();
  const [searching, setSearching] = useState(false);
  const here = sections.find((section) => isWithin(section, pathname));
  return (
    <header className="frame-top">
      <Menu>
        <MenuTrigger disableButtonEnhancement>
          <Button appearance="subtle" icon={<Navigation20Regular />} aria-label="Sections" />
        </MenuTrigger>
        <MenuPopover>
          <MenuList>
            {sections.map((section) => (
              <MenuItem
                key={section.path}
                aria-current={section === here ? 'page' : undefined}
                onClick={() => void navigate(section.path)}
              >
                {section.title}
              </MenuItem>
            ))}
          </MenuList>
        </MenuPopover>
      </Menu>
      <Link to="/desk" className="frame-word">
        Siltlight
      </Link>
      <span className="frame-here">{here?.title}</span>
      <span className="sl-grow" />
      <Button
        appearance="subtle"
        icon={<Search20Regular />}
        aria-label="Search"
        onClick={() => setSearching(true)}
      />
      <JobsRing />
      <PersonMenu />
      {searching && <SearchBox focusFirst onDone={() => setSearching(false)} />}
    </header>
  );
}
