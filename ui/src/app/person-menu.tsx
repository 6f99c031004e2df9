import {
  Avatar,
  Menu,
  MenuDivider,
  MenuGroup,
  MenuGroupHeader,
  MenuItem,
  MenuItemRadio,
  MenuList,
  MenuPopover,
  MenuTrigger,
} from '@fluentui/react-components';
import { useMutation } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { signOut } from '../features/session/queries';
import { usePerson, useSession } from '../shared/api/session';
import { useSay } from '../shared/feedback/toasts';
import { useColourMode, type ThemeChoice } from '../shared/theme/colour-mode';
import { menuOf } from './sections';

/** The person: own pages, the theme, sign out. */
export function PersonMenu() {
  const person = usePerson();
  const { demo } = useSession();
  const { choice, choose } = useColourMode();
  const navigate = useNavigate();
  const say = useSay();
  const leave = useMutation({
    mutationFn: signOut,
    // A page of its own: nothing that was loaded for this person stays in memory.
    onSuccess: () => window.location.assign('/sign-in'),
    onError: (error) => say('You are still signed in', error.message, 'error'),
  });
  return (
    <Menu
      checkedValues={{ theme: [choice] }}
      onCheckedValueChange={(_, data) => choose(data.checkedItems[0] as ThemeChoice)}
    >
      <MenuTrigger disableButtonEnhancement>
        <button type="button" className="person-button" aria-label={`${person.name}: menu`}>
          <Avatar size={28} initials={person.initials} color="neutral" aria-hidden />
        </button>
      </MenuTrigger>
      <MenuPopover>
        <MenuList>
          <MenuGroup>
            <MenuGroupHeader>
              {person.name}
              {person.roles.length > 0 && `, ${person.roles.join(', ')}`}
            </MenuGroupHeader>
            {menuOf(person, demo).map((section) => (
              <MenuItem key={section.path} onClick={() => void navigate(section.path)}>
                {section.title}
              </MenuItem>
            ))}
          </MenuGroup>
          <MenuDivider />
          <MenuGroup>
            <MenuGroupHeader>Theme</MenuGroupHeader>
            <MenuItemRadio name="theme" value="system">
              As the system
            </MenuItemRadio>
            <MenuItemRadio name="theme" value="light">
              Light
            </MenuItemRadio>
            <MenuItemRadio name="theme" value="dark">
              Dark
            </MenuItemRadio>
          </MenuGroup>
          <MenuDivider />
          <MenuItem onClick={() => leave.mutate()}>Sign out</MenuItem>
        </MenuList>
      </MenuPopover>
    </Menu>
  );
}
