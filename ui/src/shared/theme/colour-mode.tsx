import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';
import type { ColourMode } from './tokens';

export type ThemeChoice = 'system' | ColourMode;
const storageKey = 'siltlight-theme';
const prefersDark = '(prefers-color-scheme: dark)';

type ColourModeState = { mode: ColourMode; choice: ThemeChoice; choose: (choice: ThemeChoice) => void };
const ColourModeContext = createContext<ColourModeState>({
  mode: 'light',
  choice: 'system',
  choose: () => undefined,
});

export const useColourMode = () => useContext(ColourModeContext);

function remembered(): ThemeChoice {
  const value = localStorage.getItem(storageKey);
  return value === 'light' || value === 'dark' ? value : 'system';
}

/** The person's choice wins over the system's; print always takes the light theme. */
export function ColourModeProvider({ children }: { children: ReactNode }) {
  const [choice, setChoice] = useState<ThemeChoice>(remembered);
  const systemIsDark = useMedia(prefersDark);
  const printing = useMedia('print');
  const mode: ColourMode = printing
    ? 'light'
    : choice === 'system'
      ? systemIsDark
        ? 'dark'
        : 'light'
      : choice;

  useEffect(() => {
    document.documentElement.style.colorScheme = mode;
    document.documentElement.dataset.theme = mode;
  }, [mode]);

  const state = useMemo(() => {
    const choose = (next: ThemeChoice) => {
      localStorage.setItem(storageKey, next);
      setChoice(next);
    };
    return { mode, choice, choose };
  }, [mode, choice]);
  return <ColourModeContext value={state}>{children}</ColourModeContext>;
}

/** Whether a media query holds, followed while it changes. */
export function useMedia(query: string): boolean {
  const [holds, setHolds] = useState(() => window.matchMedia(query).matches);
  useEffect(() => {
    const media = window.matchMedia(query);
    const follow = () => setHolds(media.matches);
    follow();
    media.addEventListener('change', follow);
    return () => media.removeEventListener('change', follow);
  }, [query]);
  return holds;
}

export const useNarrow = () => useMedia('(max-width: 899.98px)');
