import { screen, waitFor, within } from '@testing-library/react';
import { expect, it, vi } from 'vitest';
import { problem } from '../../test/fake-api.js';
import { id, page, scenario, study, weatherYear } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';

// Another feature's, with tests of its own.
vi.mock('../run-progress/run-panel.js', () => ({ RunPanel: () => null }));

const ADDRESS = `/studies/${id(10)}`;

function withStudy(shown = study(), role: 'engineer' | 'student' = 'engineer') {
  return apiFor(role)
    .on('GET /api/studies/{id}', { body: shown })
    .on('GET /api/weather-years', {
      body: page([weatherYear(), weatherYear({ id: id(31), name: 'Desert', synthetic: false })]),
    });
}

it('leads from the empty list to a new study with its question', async () => {
  const api = apiFor('engineer')
    .on('GET /api/studies', { body: page([]) })
    .on('POST /api/studies', { status: 201, body: study({ scenarios: [], scenarioCount: 0 }) })
    .on('GET /api/studies/{id}', { body: study({ scenarios: [], scenarioCount: 0 }) });
  const { user, router } = renderApp('/studies');
  await screen.findByText('No study yet');
  await user.click(screen.getAllByRole('button', { name: 'New study' })[0]!);
  const dialog = await screen.findByRole('dialog', { name: 'New study' });
  await user.click(within(dialog).getByRole('button', { name: 'Create study' }));
  expect(await within(dialog).findByText('a name is needed')).toBeInTheDocument();
  expect(api.callsOf('POST /api/studies')).toHaveLength(0);

  await user.type(within(dialog).getByLabelText(/Name/), 'Lido');
  await user.type(within(dialog).getByLabelText('Question'), 'How warm?');
  await user.click(within(dialog).getByRole('button', { name: 'Create study' }));
  await screen.findByText('No scenario yet');
  expect(api.callsOf('POST /api/studies')[0]?.body).toEqual({ name: 'Lido', question: 'How warm?' });
  expect(router.state.location.pathname).toBe(ADDRESS);
});

it('lists question, weather, last result and what is running', async () => {
  const { scenarios: _, ...summary } = study({
    activeRuns: 2,
    lastRunFinishedAt: '2026-03-01T10:00:00.000Z',
  });
  apiFor('engineer').on('GET /api/studies', { body: page([summary]) });
  renderApp('/studies');
  const row = await screen.findByRole('listitem');
  expect(row).toHaveTextContent('Is a dual cell receiver worth its price?');
  expect(row).toHaveTextContent('2 runs under way');
  expect(row).toHaveTextContent('Brackenfold Synthetic');
  expect(row).toHaveTextContent(/1 Mar 2026/);
});

it('says what failed, and loads again at a press', async () => {
  const api = apiFor('engineer').on(
    'GET /api/studies',
    problem(422, 'Broken filter', { reference: 'ref-1' }),
  );
  const { user } = renderApp('/studies');
  const alert = await screen.findByRole('alert');
  expect(alert).toHaveTextContent('The studies could not be loaded.');
  expect(alert).toHaveTextContent('ref-1');
  api.on('GET /api/studies', { body: page([]) });
  await user.click(within(alert).getByRole('button', { name: 'Try again' }));
  await screen.findByText('No study yet');
});

it('points all scenarios of a study at a weather year', async () => {
  const api = withStudy();
  const moved = study({
    weatherYears: [{ id: id(31), name: 'Desert', synthetic: false }],
    scenarios: [scenario({ version: 2, weatherYearId: id(31), weatherYearName: 'Desert' })],
  });
  api.on('PUT /api/studies/{id}/weather-year', () => {
    api.on('GET /api/studies/{id}', { body: moved });
    return { body: moved };
  });
  const { user } = renderApp(ADDRESS);
  // The present year is synthetic and says so.
  expect(await screen.findByText(/All scenarios run on/)).toHaveTextContent('Brackenfold Synthetic');
  const choice = screen.getByRole('combobox', { name: 'Weather year of all scenarios' });
  await user.click(choice);
  expect(await screen.findByRole('option', { name: /Brackenfold \(synthetic\)/ })).toBeInTheDocument();
  await user.click(screen.getByRole('option', { name: /Desert/ }));
  await user.click(screen.getByRole('button', { name: 'Point the study at it' }));
  expect(await screen.findByText(/All scenarios point at it now/)).toBeInTheDocument();
  expect(api.callsOf('PUT /api/studies/{id}/weather-year')[0]).toMatchObject({
    params: { id: id(10) },
    body: { weatherYearId: id(31) },
  });
  expect(screen.queryByText('Synthetic')).not.toBeInTheDocument();
});

it('lets a student read a shared study, change nothing, and says why', async () => {
  withStudy(study({ mayWrite: false }), 'student');
  renderApp(ADDRESS);
  expect(await screen.findByText(/your role does not change studies/)).toBeInTheDocument();
  await screen.findByText(/All scenarios run on/);
  for (const name of ['Rename', 'Delete', 'Add a scenario', 'Point the study at it']) {
    expect(screen.queryByRole('button', { name })).not.toBeInTheDocument();
  }
});

it('adds the default machine with the chosen receiver on the weather year of the study', async () => {
  const api = withStudy().on('POST /api/studies/{id}/scenarios', {
    status: 201,
    body: scenario({ id: id(22), position: 1 }),
  });
  const { user, router } = renderApp(ADDRESS);
  await user.click(await screen.findByRole('button', { name: 'Add a scenario' }));
  const dialog = await screen.findByRole('dialog', { name: 'Add a scenario' });
  await user.type(within(dialog).getByLabelText(/Name/), 'Dual');
  await user.click(within(dialog).getByRole('radio', { name: /Cell receiver/ }));
  api.on('GET /api/scenarios/{id}', { body: scenario({ id: id(22), position: 1 }) });
  await user.click(within(dialog).getByRole('button', { name: 'Add and open' }));
  await waitFor(() => {
    expect(router.state.location.pathname).toBe(`${ADDRESS}/scenarios/${id(22)}`);
  });
  expect(api.callsOf('POST /api/studies/{id}/scenarios')[0]?.body).toMatchObject({
    name: 'Dual',
    weatherYearId: id(30),
    document: { catch: { receiver: { kind: 'cell' } } },
  });
});

it('asks before a study is deleted, and deletes only then', async () => {
  const api = withStudy()
    .on('DELETE /api/studies/{id}', { status: 204 })
    .on('GET /api/studies', { body: page([]) });
  const { user } = renderApp(ADDRESS);
  await user.click(await screen.findByRole('button', { name: 'Delete' }));
  const dialog = await screen.findByRole('alertdialog');
  await user.click(within(dialog).getByRole('button', { name: 'Keep it' }));
  expect(api.callsOf('DELETE /api/studies/{id}')).toHaveLength(0);

  await user.click(await screen.findByRole('button', { name: 'Delete' }));
  await user.click(await screen.findByRole('button', { name: 'Delete study' }));
  await screen.findByRole('heading', { level: 1, name: 'Studies' });
  expect(api.callsOf('DELETE /api/studies/{id}')).toHaveLength(1);
});

it('says that a study of another workspace is not there', async () => {
  apiFor('engineer').on('GET /api/studies/{id}', problem(404, 'No such study'));
  renderApp(ADDRESS);
  const alert = await screen.findByRole('alert');
  expect(alert).toHaveTextContent('No such study');
  expect(alert).toHaveTextContent('it belongs to another workspace');
});

it('has a page for addresses that lead nowhere', async () => {
  apiFor('engineer');
  renderApp('/nothing/here');
  expect(await screen.findByText('Nothing stands at /nothing/here')).toBeInTheDocument();
});
