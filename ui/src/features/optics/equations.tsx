import { Button } from '@fluentui/react-components';
import { ChevronDown16Regular, ChevronRight16Regular } from '@fluentui/react-icons';
import { lazy, Suspense, useState } from 'react';
import { LoadingRows } from '../../shared/feedback/loading';

const Equation = lazy(() => import('./equation'));

const equations = [
  {
    title: 'Size of a mode',
    formula:
      '\\frac{\\mathrm{d}N}{\\mathrm{d}\\ln r}=\\frac{N}{\\sqrt{2\\pi}\\,\\ln\\sigma_g}\\exp\\!\\left(-\\frac{\\ln^2(r/r_g)}{2\\ln^2\\sigma_g}\\right),\\quad r_{\\min}\\le r\\le r_{\\max}',
    source: 'Number-lognormal, cut at two radii; the cut removes particles. Common practice, no source.',
  },
  {
    title: 'One sphere',
    formula:
      'Q_{\\mathrm{sca}}=\\frac{2}{x^2}\\sum_j(2j+1)\\left(|a_j|^2+|b_j|^2\\right),\\quad x=\\frac{2\\pi r}{\\lambda},\\quad m=n-\\mathrm{i}k',
    source:
      'Mie (1908), Ann. Phys. 330, 377–445; terms of the series after Wiscombe (1980), Appl. Opt. 19, 1505–1509 (from memory).',
  },
  {
    title: 'All modes',
    formula:
      '\\mathrm{MEE}=\\frac{\\sum f\\,C_{\\mathrm{ext}}}{\\sum f\\rho\\,\\tfrac43\\pi\\int r^3\\mathrm{d}N},\\quad \\omega=\\frac{\\sum f\\,C_{\\mathrm{sca}}}{\\sum f\\,C_{\\mathrm{ext}}},\\quad g=\\frac{\\sum f\\,g\\,C_{\\mathrm{sca}}}{\\sum f\\,C_{\\mathrm{sca}}}',
    source: 'Bohren & Huffman (1983), Absorption and Scattering of Light by Small Particles (from memory).',
  },
  {
    title: 'Minerals in one particle',
    formula:
      '\\sum_i f_i\\,\\frac{\\varepsilon_i-\\varepsilon}{\\varepsilon_i+2\\varepsilon}=0\\ \\text{(Bruggeman)},\\quad \\varepsilon=\\varepsilon_0\\frac{1+2S}{1-S},\\ S=\\sum_i f_i\\frac{\\varepsilon_i-\\varepsilon_0}{\\varepsilon_i+2\\varepsilon_0}\\ \\text{(Maxwell Garnett)}',
    source:
      'Bruggeman (1935), Ann. Phys. 416, 636–664; Maxwell Garnett (1904), Phil. Trans. R. Soc. A 203, 385–420 (from memory).',
  },
  {
    title: 'Water uptake',
    formula: '\\left(\\frac{D}{D_{\\mathrm{dry}}}\\right)^{3}=1+\\kappa\\,\\frac{RH}{1-RH}',
    source: 'Petters & Kreidenweis (2007), Atmos. Chem. Phys. 7, 1961–1971; no curvature term.',
  },
] as const;

/** The equations behind the numbers, each with its source. */
export function Equations() {
  const [open, setOpen] = useState(false);
  return (
    <section className="optics-equations" aria-label="Equations">
      <Button
        appearance="transparent"
        size="small"
        aria-expanded={open}
        icon={open ? <ChevronDown16Regular /> : <ChevronRight16Regular />}
        onClick={() => setOpen(!open)}
      >
        Equations and their sources
      </Button>
      {open && (
        <Suspense fallback={<LoadingRows rows={5} />}>
          {equations.map(({ title, formula, source }) => (
            <article key={title}>
              <h4>{title}</h4>
              <div className="optics-scroll" tabIndex={0} role="region" aria-label={`Equation: ${title}`}>
                <Equation formula={formula} label={title} />
              </div>
              <p className="sl-small sl-muted">{source}</p>
            </article>
          ))}
        </Suspense>
      )}
    </section>
  );
}
