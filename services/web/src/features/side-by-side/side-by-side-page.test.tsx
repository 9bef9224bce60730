import { MODEL_VERSION } from '@noonwell/engine';
import { newScenario, runSchema, type ScenarioView } from '@noonwell/schema';
import { screen, waitFor, within } from '@testing-library/react';
import type { Data } from 'plotly.js';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { requestColumns } from '../../shared/api/arrow.js';
import { problem } from '../../test/fake-api.js';
import { id, scenario, study, weatherYear } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';
import { summaryFixture } from './model/fixtures.js';

const drawn = vi.hoisted(() => ({ figures: [] as (readonly Data[])[] }));
vi.mock('../../shared/charts/plotly.js', () => ({
  PlotlyChart: ({ data }: { data: readonly Data[] }) => {
    drawn.figures.push(data);
    return null;
  },
}));

const HOUR_MS = 3_600_000;
vi.mock('../../shared/api/arrow.js', () => ({
  requestColumns: ((_route, { query }) => {
    const wanted = String(query?.['channels']).split(',');
    const start = Float64Array.from({ length: 8760 }, (_, hour) => Date.UTC(2001, 0, 1) + hour * HOUR_MS);
    return Promise.resolve(
      new Map([['startLocalMs', start], ...wanted.map((key) => [key, new Float64Array(8760)] as const)]),
    );
  }) satisfies typeof requestColumns,
}));

const ADDRESS = `/studies/${id(10)}/side-by-side`;

function done(number: number, name: string, summary: ReturnType<typeof summaryFixture>): ScenarioView {
  return scenario({
    id: id(number),
    name,
    position: number - 20,
    document: newScenario(summary.powerAcKwh > 0 ? 'cell' : 'coil'),
    latestRun: runSchema.parse({
      id: id(number + 40),
      studyId: id(10),
      scenarioId: id(number),
      scenarioVersionId: id(21),
      scenarioVersion: 1,
      weatherYearId: id(30),
      state: 'done',
      progress: 1,
      failure: null,
      cancelRequested: false,
      modelVersion: MODEL_VERSION,
      createdAt: '2026-03-01T09:30:00.000Z',
      startedAt: '2026-03-01T09:30:00.000Z',
      finishedAt: '2026-03-01T09:30:02.000Z',
      engineMs: 400,
      summary,
    }),
  });
}

const coil = () => done(20, 'Coil', summaryFixture({ summary: { heatDeliveredKwh: 10_000, powerAcKwh: 0 } }));
const cell = () =>
  done(21, 'Cells', summaryFixture({ summary: { heatDeliveredKwh: 6400, powerAcKwh: 1850 } }));

beforeEach(() => {
  drawn.figures.length = 0;
});

function open(scenarios: readonly ScenarioView[], query = '') {
  const api = apiFor('engineer')
    .on('GET /api/studies/{id}', { body: study({ scenarios: [...scenarios] }) })
    .on('GET /api/weather-years/{id}', { body: weatherYear() });
  return { api, ...renderApp(`${ADDRESS}${query}`) };
}

const plain = (text: string | null) => (text ?? '').replaceAll(/[\u00a0\u202f]/g, ' ');

describe('side by side', () => {
  it('says first what is given up and gained, before any table', async () => {
    open([coil(), cell()]);
    const sentence = await screen.findByText(/^Against “Coil”/);
    expect(plain(sentence.textContent)).toContain(
      '“Cells” gives up 3,600 kWh of solar heat to the load (36.0 % less), but gains 1,850 kWh of electricity',
    );
    const table = screen.getByRole('region', { name: /The year's totals/ });
    expect(sentence.compareDocumentPosition(table)).toBe(Node.DOCUMENT_POSITION_FOLLOWING);
    const heat = within(table).getByRole('row', { name: /Solar heat delivered/ });
    expect(
      within(heat)
        .getAllByRole('cell')
        .map(({ textContent }) => textContent),
    ).toEqual(['10,000', '6,400', '\u22123,600', '\u221236.0', 'worse']);
  });

  it('shows a ledger by part with its residual as a number', async () => {
    open([coil(), cell()]);
    const store = await screen.findByRole('region', { name: 'Ledger of the store over the year' });
    const rows = within(store).getAllByRole('row');
    expect(rows.at(-1)).toHaveTextContent(/^Residual/);
    expect(within(rows.at(-1)!).getAllByRole('cell').at(-1)).toHaveTextContent(/^0$|e\u2212\d+$/);
    expect(within(store).getByRole('row', { name: /Heat to the tank/ })).toHaveTextContent(
      'enters650.0650.0',
    );
  });

  it('says how long the tracker was in each state, and what share of the beam came then', async () => {
    open([coil(), cell()]);
    const states = await screen.findByRole('region', { name: /^States of the tracker/ });
    // 100 of the 1000 kWh of beam are met at night in the fixture's ledger; the rest is met on the sun.
    expect(within(states).getByRole('row', { name: /^On the sun/ })).toHaveTextContent('090.0090.0');
    expect(within(states).getByRole('row', { name: /^Sun down, parked/ })).toHaveTextContent('010.0010.0');
  });

  it('puts the chosen baseline, the week and the channels into the address', async () => {
    const { router, user } = open([coil(), cell()]);
    await user.click(await screen.findByRole('radio', { name: 'Cells' }));
    expect(await screen.findByText(/^Against “Cells”/)).toBeInTheDocument();
    await user.selectOptions(await screen.findByLabelText('Week from'), 'March');
    // The router draws a change of the address when there is time: whoever steps on from a week has seen it.
    await waitFor(() => {
      expect(screen.getByLabelText('Week from')).toHaveDisplayValue('March');
    });
    await user.click(screen.getByRole('button', { name: 'A week later' }));
    await waitFor(() => {
      expect(screen.getByLabelText('Day')).toHaveDisplayValue('8');
    });
    await user.selectOptions(screen.getByLabelText('Look at'), 'Receiver');
    await waitFor(() => {
      const query = new URLSearchParams(router.state.location.search);
      expect(Object.fromEntries(query)).toEqual({ v: '1', base: id(21), week: '03-08', hours: 'receiver' });
    });
  });

  it('opens at what the address says', async () => {
    open([coil(), cell()], `?v=1&base=${id(21)}&week=07-04&hours=weather&hide=${id(20)}`);
    expect(await screen.findByText(/^Against “Cells”/)).toBeInTheDocument();
    expect(await screen.findByLabelText('Week from')).toHaveValue('07');
    expect(screen.getByLabelText('Day')).toHaveValue('07-04');
    expect(screen.getByLabelText('Look at')).toHaveValue('weather');
    expect(screen.getByRole('checkbox', { name: 'Coil' })).not.toBeChecked();
    await waitFor(() => {
      expect(drawn.figures.length).toBeGreaterThan(0);
    });
    // What is hidden is drawn nowhere and stays in the tables.
    const names = drawn.figures.flat().map(({ name }) => name ?? '');
    expect(names.filter((name) => name.startsWith('Coil'))).toEqual([]);
    expect(screen.getByRole('region', { name: /The year's totals/ })).toHaveTextContent('Coil');
  });

  it('draws a week of hours as seven days on one time axis', async () => {
    open([coil(), cell()], '?v=1&week=02-26');
    await waitFor(() => {
      const hours = drawn.figures.at(-1)?.filter((trace) => trace.type === 'scatter');
      expect(hours?.length).toBeGreaterThan(0);
    });
    const traces = drawn.figures.flat().filter((trace) => trace.type === 'scatter');
    for (const trace of traces as { x: Float64Array; y: Float64Array }[]) {
      expect([trace.x.length, trace.y.length]).toEqual([168, 168]);
      expect(trace.x[167]! - trace.x[0]!).toBe(167 * HOUR_MS);
    }
  });
});

describe('when there is little to compare', () => {
  it('leads to the study when nothing has been run', async () => {
    open([scenario()]);
    expect(await screen.findByText('No result yet')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Go to the study and run it' })).toHaveAttribute(
      'href',
      `/studies/${id(10)}`,
    );
  });

  it('names the scenario without a result beside those that have one', async () => {
    open([coil(), scenario({ id: id(21), position: 1, name: 'Not yet' })]);
    expect(await screen.findByText(/Without a result of the newest version: Not yet\./)).toBeInTheDocument();
    expect(screen.getByRole('region', { name: /The year's totals/ })).toBeInTheDocument();
  });

  it('says what could not be loaded', async () => {
    apiFor('engineer').on('GET /api/studies/{id}', problem(404, 'Not found'));
    renderApp(ADDRESS);
    expect(await screen.findByText('The study could not be loaded.')).toBeInTheDocument();
  });
});
