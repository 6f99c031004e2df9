import katex from 'katex';
import 'katex/dist/katex.min.css';
import { useMemo } from 'react';

/** A typeset equation. KaTeX writes the markup itself from our own formulas; nothing a person typed comes here. */
export default function Tex({ formula, label }: { formula: string; label: string }) {
  const html = useMemo(
    () => katex.renderToString(formula, { displayMode: true, throwOnError: false, output: 'htmlAndMathml' }),
    [formula],
  );
  return <div className="tex" role="math" aria-label={label} dangerouslySetInnerHTML={{ __html: html }} />;
}
