import { render } from '@testing-library/react';
import { Prose } from './prose';

test('raised exponents of a sentence are set as such, the rest stays', () => {
  const { container } = render(
    <Prose text={'below 5 W m\u207b\u00b2 and 2 g m\u207b\u00b2 yr\u207b\u00b9, I\u00b2 kept'} />,
  );
  expect([...container.querySelectorAll('sup')].map((sup) => sup.textContent)).toEqual([
    '\u22122',
    '\u22122',
    '\u22121',
  ]);
  expect(container).toHaveTextContent('I\u00b2 kept');
});
