import { render } from '@testing-library/react';
import { Digits } from './digits';
import { Unit } from './unit';

test('an exponent is raised with a true minus and never a raised-minus character', () => {
  const { container } = render(<Unit of="g m-2 yr-1" />);
  expect(container.innerHTML).toContain('m<sup>\u22122</sup>');
  expect(container.textContent).toBe('g\u00a0m\u22122\u00a0yr\u22121');
});

test('digit groups are parted by a margin, so that a copied number stays one number', () => {
  const { container } = render(<Digits value={8760123} figures={3} decimals={0} />);
  expect(container.textContent).toBe('8760123');
  expect(container.querySelectorAll('.sl-digits span')).toHaveLength(3);
});

test('an absent value is a dash', () => {
  expect(render(<Digits value={null} />).container.textContent).toBe('–');
});
