import katex from 'katex';
import 'katex/dist/katex.min.css';

/** A typeset equation. KaTeX writes the markup itself from our own formulas; nothing a person typed comes here. */
export default function Equation({ formula, label }: { formula: string; label: string }) {
  const html = katex.renderToString(formula, {
    displayMode: true,
    throwOnError: false,
    output: 'htmlAndMathml',
  });
  return <div role="math" aria-label={label} dangerouslySetInnerHTML={{ __html: html }} />;
}
