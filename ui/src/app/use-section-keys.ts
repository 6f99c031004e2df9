import { useEffect } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Section } from './sections';

const PAUSE_MS = 1200;

const isTyping = (target: EventTarget | null) =>
  target instanceof HTMLElement &&
  (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));

/** `g` and then a letter goes to a section; nothing happens while somebody types. */
export function useSectionKeys(sections: readonly Section[]): void {
  const navigate = useNavigate();
  useEffect(() => {
    let pressedAt = -Infinity;
    const listen = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return;
      const waited = event.timeStamp - pressedAt;
      pressedAt = event.key === 'g' ? event.timeStamp : -Infinity;
      const section = sections.find((one) => one.key === event.key);
      if (waited < PAUSE_MS && section) {
        event.preventDefault();
        void navigate(section.path);
      }
    };
    window.addEventListener('keydown', listen);
    return () => window.removeEventListener('keydown', listen);
  }, [navigate, sections]);
}
