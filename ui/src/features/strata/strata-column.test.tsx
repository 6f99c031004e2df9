import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { StrataColumn } from './strata-column';

const slices: ColumnSlice[] = [
  {
    slug: 'pi',
    name: 'Pre-industrial',
    label: 'PI',
    youngKa: 0,
    oldKa: 0.1,
    parentSlug: null,
    kind: 'evidence',
    latestNetWm2: null,
    stale: false,
  },
  {
    slug: 'mh',
    name: 'Mid-Holocene',
    label: 'MH',
    youngKa: 5.5,
    oldKa: 6.5,
    parentSlug: null,
    kind: 'evidence',
    latestNetWm2: 0.11,
    stale: true,
  },
  {
    slug: 'lgm',
    name: 'Last Glacial Maximum',
    label: 'LGM',
    youngKa: 19,
    oldKa: 23,
    parentSlug: null,
    kind: 'evidence',
    latestNetWm2: -0.42,
    stale: false,
  },
];

function show(selected: string | null) {
  const router = createMemoryRouter([
    {
      path: '*',
      element: (
        <StrataColumn
          slices={slices}
          selected={selected}
          open
          heightPx={400}
          addressOf={(slug) => `/slices/${slug}`}
        />
      ),
    },
  ]);
  render(<RouterProvider router={router} />);
  return router;
}

test('the column is a list of links that say age, forcing and stale inputs in words', () => {
  show('lgm');
  expect(screen.getAllByRole('listitem')).toHaveLength(3);
  expect(
    screen.getByRole('link', { name: /Last Glacial Maximum, 23 to 19 ka, net forcing \u22120.42/ }),
  ).toHaveAttribute('aria-current', 'true');
  expect(screen.getByRole('link', { name: /Mid-Holocene.*inputs superseded/ })).toBeInTheDocument();
  expect(screen.getByRole('link', { name: /Pre-industrial.*no estimate yet/ })).toBeInTheDocument();
});

test('one tab stop leads into the column, at the picked bed', () => {
  show('lgm');
  expect(screen.getAllByRole('link').filter((link) => link.tabIndex === 0)).toHaveLength(1);
  expect(screen.getByRole('link', { name: /Last Glacial/ }).tabIndex).toBe(0);
});

test('arrow keys move along the beds, Home and End go to the ends, Enter picks', async () => {
  const user = userEvent.setup();
  const router = show('lgm');
  await user.tab();
  expect(screen.getByRole('link', { name: /Last Glacial/ })).toHaveFocus();
  await user.keyboard('{ArrowUp}');
  expect(screen.getByRole('link', { name: /Mid-Holocene/ })).toHaveFocus();
  await user.keyboard('{Home}');
  expect(screen.getByRole('link', { name: /Pre-industrial/ })).toHaveFocus();
  await user.keyboard('{ArrowUp}');
  expect(screen.getByRole('link', { name: /Pre-industrial/ })).toHaveFocus();
  await user.keyboard('{End}{ArrowUp}{Enter}');
  expect(router.state.location.pathname).toBe('/slices/mh');
});
