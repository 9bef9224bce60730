import { MODEL_VERSION } from '@noonwell/engine';
import { runSchema, type Role, type Run, type RunEvent } from '@noonwell/schema';
import { act, screen, within } from '@testing-library/react';
import { beforeEach, expect, it, vi } from 'vitest';
import type { listen } from '../../shared/api/events.js';
import { problem } from '../../test/fake-api.js';
import { id, page, scenario, study, weatherYear } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';

const line = vi.hoisted(() => ({ send: (_: unknown): void => undefined }));
vi.mock('../../shared/api/events.js', () => ({
  listen: ((_route, _call, { onEvent, onState }) => {
    line.send = onEvent as (event: unknown) => void;
    onState?.('open');
    return () => undefined;
  }) satisfies typeof listen,
}));

const ADDRESS = `/studies/${id(10)}`;

function run(over: Partial<Run> = {}): Run {
  return runSchema.parse({
    id: id(40),
    studyId: id(10),
    scenarioId: id(20),
    scenarioVersionId: id(21),
    scenarioVersion: 1,
    weatherYearId: id(30),
    state: 'queued',
    progress: 0,
    failure: null,
    cancelRequested: false,
    modelVersion: MODEL_VERSION,
    createdAt: '2026-03-01T09:30:00.000Z',
    startedAt: null,
    finishedAt: null,
    engineMs: null,
    summary: null,
    ...over,
  });
}

function event(over: Partial<RunEvent> = {}): RunEvent {
  return { runId: id(40), scenarioId: id(20), state: 'running', progress: 0.25, failure: null, ...over };
}

let latestRun: Run | null;
beforeEach(() => {
  latestRun = null;
});

function open({ mayWrite = true, role = 'engineer' }: { mayWrite?: boolean; role?: Role } = {}) {
  const api = apiFor(role)
    .on('GET /api/studies/{id}', () => ({ body: study({ mayWrite, scenarios: [scenario({ latestRun })] }) }))
    .on('GET /api/weather-years', { body: page([weatherYear()]) });
  return { api, ...renderApp(ADDRESS) };
}

const row = () => screen.findByRole('listitem', { name: 'Present coil receiver' });

it('starts all runs, follows the events and asks for the result when a run is done', async () => {
  const { api, user } = open();
  api.on('POST /api/studies/{id}/runs', () => {
    latestRun = run();
    return { body: { runs: [latestRun] } };
  });
  await user.click(await screen.findByRole('button', { name: 'Run all scenarios' }));
  expect(await within(await row()).findByText('Queued')).toBeInTheDocument();
  expect(api.callsOf('POST /api/studies/{id}/runs')[0]?.body).toEqual({});

  act(() => {
    line.send(event());
  });
  const bar = await screen.findByRole('progressbar', { name: 'Run of Present coil receiver' });
  expect(bar).toHaveAttribute('aria-valuenow', '0.25');

  latestRun = run({ state: 'done', progress: 1, finishedAt: '2026-03-01T09:31:00.000Z', engineMs: 400 });
  act(() => {
    line.send(event({ state: 'done', progress: 1 }));
  });
  expect(await within(await row()).findByText(/computed in 0\.4/)).toBeInTheDocument();
  expect(screen.getByRole('button', { name: 'Run all scenarios' })).toBeDisabled();
});

it('says why a run failed and tries it again', async () => {
  latestRun = run({ state: 'failed', failure: 'store, weather record 12: no balance.' });
  const { api, user } = open();
  api.on('POST /api/runs/{id}/retry', () => {
    latestRun = run();
    return { body: latestRun };
  });
  expect(await within(await row()).findByText(/store, weather record 12: no balance\./)).toBeInTheDocument();
  await user.click(screen.getByRole('button', { name: 'Run Present coil receiver again' }));
  expect(await within(await row()).findByText('Queued')).toBeInTheDocument();
});

it('asks a run to stop, and shows that it is stopping until it has', async () => {
  latestRun = run({ state: 'running', progress: 0.4 });
  const { api, user } = open();
  api.on('POST /api/runs/{id}/cancel', () => {
    latestRun = run({ state: 'running', progress: 0.4, cancelRequested: true });
    return { body: latestRun };
  });
  await user.click(await screen.findByRole('button', { name: 'Cancel the run of Present coil receiver' }));
  expect(await within(await row()).findByText('Stopping …')).toBeInTheDocument();
  expect(screen.getByRole('button', { name: 'Cancel the run of Present coil receiver' })).toBeDisabled();
});

it('says what a refusal said', async () => {
  const { api, user } = open();
  api.on('POST /api/studies/{id}/runs', problem(409, 'Too many runs', { detail: 'Wait for one to end.' }));
  await user.click(await screen.findByRole('button', { name: 'Run all scenarios' }));
  expect(await screen.findByText(/Wait for one to end\./)).toBeInTheDocument();
});

it('offers nothing to those who may only read', async () => {
  latestRun = run({ state: 'running', progress: 0.4 });
  open({ mayWrite: false, role: 'student' });
  await row();
  expect(screen.queryByRole('button', { name: 'Run all scenarios' })).toBeNull();
  expect(screen.queryByRole('button', { name: /^Cancel the run/ })).toBeNull();
  expect(screen.getByText(/Only people who may change this study/)).toBeInTheDocument();
});
