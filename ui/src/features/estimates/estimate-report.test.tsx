import { FluentProvider } from '@fluentui/react-components';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { MapData } from '../../shared/map/map-data';
import { regionsQuery } from '../../shared/map/regions-query';
import { themes } from '../../shared/theme/themes';
import { EstimateReport } from './estimate-report';
import { inventedEstimate, inventedResult, inventedSite } from './report.test-support';

// The drawing needs a canvas, which jsdom lacks: buttons in its place take what the map is told and tell what it would.
vi.mock('../../shared/map/map-canvas', () => ({
  default: ({
    data,
    onSelect,
    onHover,
  }: {
    data: MapData;
    onSelect?: (code: string) => void;
    onHover?: (code: string) => void;
  }) => (
    <>
      {data.regions.map((region) => (
        <button
          key={region.code}
          type="button"
          aria-pressed={region.code === data.selected}
          data-hovered={region.code === data.hovered}
          onClick={() => onSelect?.(region.code)}
          onPointerEnter={() => onHover?.(region.code)}
        >
          {`map ${region.code} ${data.values?.[region.code]?.toFixed(2)}`}
        </button>
      ))}
    </>
  ),
}));

const sites = [
  inventedSite('Laguna Azul', 'SSA', null),
  inventedSite('Potrok Aike', 'SSA', 'no reference flux'),
  inventedSite('Dome C', 'EAN', null),
];

function show(start = '/estimates/e1') {
  const client = new QueryClient();
  const outline = [[[0, 0] as const, [10, 0] as const, [10, 10] as const]];
  client.setQueryData(
    regionsQuery.queryKey,
    inventedResult.regions.map(({ code, name }) => ({ code, name, parts: outline })),
  );
  const report = (
    <QueryClientProvider client={client}>
      <FluentProvider theme={themes.light}>
        <EstimateReport
          estimate={inventedEstimate}
          result={inventedResult}
          sites={sites}
          traceOf={(site) => `/fields/f1/trace?site=${encodeURIComponent(site.site)}`}
          statusText={() => 'drawn to the global ratio'}
        />
      </FluentProvider>
    </QueryClientProvider>
  );
  const router = createMemoryRouter([{ path: '*', element: report }], { initialEntries: [start] });
  render(<RouterProvider router={router} />);
  return router;
}

const rowOf = (name: RegExp) =>
  within(screen.getByRole('table', { name: '3 regions' })).getByRole('row', { name });

test('picking a row marks its region on the map, opens its panel and stands in the address', async () => {
  const user = userEvent.setup();
  const router = show();
  await user.click(rowOf(/Southern South America/));
  expect(await screen.findByRole('button', { name: /^map SSA/ })).toHaveAttribute('aria-pressed', 'true');
  expect(router.state.location.search).toBe('?region=SSA');
  expect(screen.getByRole('region', { name: 'Region Southern South America' })).toBeInTheDocument();
});

test('picking a region on the map marks its row, and picking it again lets go', async () => {
  const user = userEvent.setup();
  show();
  await user.click(await screen.findByRole('button', { name: /^map ARS/ }));
  expect(rowOf(/Arabian Sea/)).toHaveAttribute('aria-selected', 'true');
  await user.click(screen.getByRole('button', { name: /^map ARS/ }));
  expect(rowOf(/Arabian Sea/)).toHaveAttribute('aria-selected', 'false');
  expect(screen.queryByRole('region', { name: /Region Arabian/ })).not.toBeInTheDocument();
});

test('a row under the keyboard is shown on the map', async () => {
  show();
  const region = await screen.findByRole('button', { name: /^map SAH/ });
  rowOf(/Sahara/).focus();
  await vi.waitFor(() => expect(region).toHaveAttribute('data-hovered', 'true'));
});

test('a region in the address is picked on arrival, and each of its sites links to its samples', async () => {
  show('/estimates/e1?region=SSA');
  const panel = await screen.findByRole('region', { name: 'Region Southern South America' });
  const links = within(panel).getAllByRole('link');
  expect(links.map((link) => link.textContent)).toEqual(['Laguna Azul', 'Potrok Aike']);
  expect(links[0]).toHaveAttribute('href', '/fields/f1/trace?site=Laguna%20Azul');
  expect(panel).toHaveTextContent('not used: no reference flux');
});

test('the shortwave tab changes map and table together', async () => {
  const user = userEvent.setup();
  const router = show();
  await user.click(await screen.findByRole('tab', { name: 'SW' }));
  expect(screen.getByRole('button', { name: 'map SAH 0.77' })).toBeInTheDocument();
  expect(router.state.location.search).toBe('?part=sw');
});

test('numbers carry sign, true minus and interval, kinds their names', () => {
  show();
  expect(screen.getByText('\u22120.42', { selector: '.big-value' })).toBeInTheDocument();
  expect(screen.getByText('5–95 %: \u22120.81 to \u22120.12')).toBeInTheDocument();
  expect(
    screen.getByText(
      /Direct forcing, top of atmosphere, all sky, net \(SW \u22120\.61, LW \+0\.19\), dust alone/,
    ),
  ).toBeInTheDocument();
  expect(screen.getByText(/another kind, not to be subtracted by eye/)).toBeInTheDocument();
  expect(screen.getByText('Direct effect, Last Glacial Maximum, all sky')).toBeInTheDocument();
  expect(screen.getByText(/greyed: of all aerosols/)).toBeInTheDocument();
});
