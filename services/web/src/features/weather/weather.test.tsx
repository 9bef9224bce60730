import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { epwFile, lineOfRow, pdfFile } from '@noonwell/testkit';
import { generateSyntheticYear, syntheticPlaceSchema, WEATHER_FILE_LIMIT_BYTES } from '@noonwell/weather';
import { expect, it, vi } from 'vitest';
import place from '../../../../../datasets/synthetic/brackenfold.json' with { type: 'json' };
import { problem } from '../../test/fake-api.js';
import { page, weatherYear } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';
import { readForPreview } from '../../workers/read-for-preview.js';

// There is no Web Worker here: the same reader runs in the page.
vi.mock('comlink', () => ({
  proxy: (callback: unknown) => callback,
  wrap: () => ({ readForPreview }),
}));
// The chart library needs a real browser.
vi.mock('../../shared/charts/plotly.js', () => ({ PlotlyChart: () => null }));

const year = generateSyntheticYear(syntheticPlaceSchema.parse(place));

class NoWorker extends EventTarget {
  terminate() {}
}

function prepare(role: 'engineer' | 'student' = 'engineer') {
  vi.stubGlobal('Worker', NoWorker);
  return apiFor(role).on('GET /api/weather-years', { body: page([]) });
}

function openWeatherPage(role: 'engineer' | 'student' = 'engineer') {
  const api = prepare(role);
  return { api, ...renderApp('/weather') };
}

async function drop(bytes: Uint8Array<ArrayBuffer>, name: string) {
  const file = new File([bytes], name);
  // jsdom's File cannot be read as bytes.
  file.arrayBuffer = () => Promise.resolve(bytes.buffer);
  const text = await screen.findByText('Drop a weather file here, or');
  fireEvent.drop(text.parentElement!, { dataTransfer: { files: { item: () => file } } });
}

it('reads a dropped file before anything is sent, then uploads it under the given name', async () => {
  const { api, user } = openWeatherPage();
  await drop(epwFile(year, { city: 'Test Field', region: '', country: 'Nowhere' }), 'field.epw');

  const name = await screen.findByLabelText(/Name in the list/);
  expect(name).toHaveValue('Test Field, Nowhere');
  expect(within(screen.getByLabelText('The year')).getByText(/^8,760 of 60.min$/)).toBeInTheDocument();
  expect(api.callsOf('POST /api/weather-years')).toHaveLength(0);

  const accepted = weatherYear({ name: 'Creamery roof' });
  api
    .on('POST /api/weather-years', { status: 201, body: accepted })
    .on('GET /api/weather-years', { body: page([accepted]) });
  await user.clear(name);
  await user.type(name, ' Creamery roof ');
  await user.click(screen.getByRole('button', { name: 'Accept as a weather year' }));

  expect(
    await screen.findByText('"Creamery roof" is a weather year of this workspace now.'),
  ).toBeInTheDocument();
  const [sent] = api.callsOf('POST /api/weather-years');
  const form = sent?.body as FormData;
  expect([...form.keys()]).toEqual(['name', 'file']);
  expect(form.get('name')).toBe('Creamery roof');
  expect((form.get('file') as File).name).toBe('field.epw');
  expect(sent?.token).toBe('token-1');
  // The list holds it at once, marked as made by Noonwell.
  const row = await screen.findByRole('row', { name: /Creamery roof/ });
  expect(within(row).getByText('Synthetic')).toBeInTheDocument();
});

it('refuses text where a number should be, with line, column, reason and remedy, and sends nothing', async () => {
  const { api } = openWeatherPage();
  const row = 4000;
  const bytes = epwFile(year, { defects: [{ kind: 'cell', row, cell: 15, text: 'cloudy' }] });
  await drop(bytes, 'text.epw');
  expect(await screen.findByRole('alert')).toHaveTextContent('"text.epw" was refused; nothing was saved.');
  const fault = screen.getByRole('row', { name: /cloudy/ });
  expect(within(fault).getByRole('rowheader')).toHaveTextContent(lineOfRow(row).toLocaleString('en-GB'));
  expect(fault).toHaveTextContent(/15 · direct normal irradiation/i);
  expect(screen.queryByRole('button', { name: /Accept/ })).not.toBeInTheDocument();
  expect(api.callsOf('POST /api/weather-years')).toHaveLength(0);
});

it.each([
  ['a PDF with the name of a weather file', pdfFile(), /PDF/],
  ['an empty file', new Uint8Array(0), /empty/],
])('refuses %s', async (_, bytes, reason) => {
  openWeatherPage();
  await drop(bytes, 'year.epw');
  expect(await screen.findByRole('alert')).toHaveTextContent('was refused');
  expect(screen.getByRole('region', { name: /Faults/ })).toHaveTextContent(reason);
});

it('refuses a file over the limit without reading it', async () => {
  openWeatherPage();
  const file = new File([], 'huge.epw');
  const read = vi.fn();
  Object.defineProperty(file, 'size', { value: WEATHER_FILE_LIMIT_BYTES + 1 });
  file.arrayBuffer = read;
  const text = await screen.findByText('Drop a weather file here, or');
  fireEvent.drop(text.parentElement!, { dataTransfer: { files: { item: () => file } } });
  expect(await screen.findByText(/64 MiB are read/)).toBeInTheDocument();
  expect(read).not.toHaveBeenCalled();
});

it("shows the server's refusal as it stands, place by place", async () => {
  const { api, user } = openWeatherPage();
  await drop(epwFile(year), 'field.epw');
  await screen.findByLabelText(/Name in the list/);
  api.on(
    'POST /api/weather-years',
    problem(422, 'The weather file was refused', {
      errors: [
        { line: 12, column: 14, columnName: 'GHI', value: '-3', reason: 'It is negative.', fix: 'Mend it.' },
      ],
    }),
  );
  await user.click(screen.getByRole('button', { name: 'Accept as a weather year' }));
  expect(
    await screen.findByRole('row', { name: /12.*14 · GHI.*It is negative.*Mend it/ }),
  ).toBeInTheDocument();
});

it('keeps the preview when the server fails, names the reference, and can send again', async () => {
  const { api, user } = openWeatherPage();
  await drop(epwFile(year), 'field.epw');
  await screen.findByLabelText(/Name in the list/);
  api.on('POST /api/weather-years', problem(500, 'The server failed', { reference: 'ref-77' }));
  await user.click(screen.getByRole('button', { name: 'Accept as a weather year' }));
  expect(await screen.findByText('ref-77')).toBeInTheDocument();
  api.on('POST /api/weather-years', { status: 201, body: weatherYear() });
  await user.click(screen.getByRole('button', { name: 'Accept as a weather year' }));
  expect(await screen.findByText(/is a weather year of this workspace now/)).toBeInTheDocument();
});

it('gives a student the list and the reason, and no drop zone', async () => {
  openWeatherPage('student');
  expect(await screen.findByText(/As a student you use the years that others added/)).toBeInTheDocument();
  expect(screen.queryByText('Drop a weather file here, or')).not.toBeInTheDocument();
  expect(await screen.findByText(/An engineer or analyst of your workspace adds them/)).toBeInTheDocument();
});

it('takes the page of the list from the address and turns pages there', async () => {
  const api = prepare();
  api.on('GET /api/weather-years', ({ query }) => ({
    body: {
      items: [weatherYear({ name: `Year of page ${query.get('page')}` })],
      page: 1,
      pageSize: 20,
      total: 41,
    },
  }));
  const { router, user } = renderApp('/weather?page=2');
  await screen.findByText('Year of page 2');
  const pages = screen.getByRole('navigation', { name: 'Pages of weather years' });
  expect(pages).toHaveTextContent('21 to 40 of 41');
  await user.click(within(pages).getByRole('button', { name: 'Next' }));
  await screen.findByText('Year of page 3');
  expect(router.state.location.search).toBe('?page=3');
});

it('says why a weather year in use stays', async () => {
  const api = prepare();
  api
    .on('GET /api/weather-years/{id}', { body: weatherYear() })
    .on('GET /api/weather-years/{id}/columns', problem(404, 'No such weather year'))
    .on(
      'DELETE /api/weather-years/{id}',
      problem(409, 'Brackenfold is in use', { detail: 'By Brackenfold Creamery.' }),
    );
  const { router, user } = renderApp(`/weather/${weatherYear().id}`);
  await user.click(await screen.findByRole('button', { name: 'Delete' }));
  await user.click(await screen.findByRole('button', { name: 'Delete weather year' }));
  expect(await screen.findByText(/By Brackenfold Creamery/)).toBeInTheDocument();
  await waitFor(() => {
    expect(router.state.location.pathname).toContain('/weather/');
  });
  expect(screen.getByText(/generated this year for an invented place/)).toBeInTheDocument();
});
