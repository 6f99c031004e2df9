import { createContext, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';

type Declared = { slug: string | null; declare: (slug: string | null) => void };
const SliceOfPageContext = createContext<Declared>({ slug: null, declare: () => undefined });

/** Lets a page whose address does not name its slice tell the strata column which one it is about. */
export function SliceOfPageProvider({ children }: { children: ReactNode }) {
  const [slug, declare] = useState<string | null>(null);
  const state = useMemo(() => ({ slug, declare }), [slug]);
  return <SliceOfPageContext value={state}>{children}</SliceOfPageContext>;
}

/** Declares, for as long as the page is shown, that it is about this slice (an estimate, a field). */
export function useSliceOfPage(slug: string | null | undefined): void {
  const { declare } = useContext(SliceOfPageContext);
  useEffect(() => {
    declare(slug ?? null);
    return () => declare(null);
  }, [declare, slug]);
}

export const useDeclaredSlice = () => useContext(SliceOfPageContext).slug;
