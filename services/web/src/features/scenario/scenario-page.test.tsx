import { newScenario, type Role, type ScenarioView } from '@noonwell/schema';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { problem } from '../../test/fake-api.js';
import { id, page, scenario, study, weatherYear } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';

const ADDRESS = `/studies/${id(10)}/scenarios/${id(20)}`;

let stored: ScenarioView;
beforeEach(() => {
  stored = scenario();
});

function open({ mayWrite = true, role = 'engineer' }: { mayWrite?: boolean; role?: Role } = {}) {
  const api = apiFor(role)
    .on('GET /api/studies/{id}', { body: study({ mayWrite }) })
    .on('GET /api/scenarios/{id}', () => ({ body: stored }))
    .on('GET /api/scenarios/{id}/versions', { body: page([]) })
    .on('GET /api/weather-years', { body: page([weatherYear()]) });
  return { api, ...renderApp(ADDRESS) };
}

// Straight through the label: the library's queries work out roles and styles of every element, which takes
// a second each in a form of this size.
function field(name: string, within: ParentNode = document): HTMLInputElement | HTMLSelectElement {
  const label = [...within.querySelectorAll('label')].find(({ textContent }) => textContent === name);
  const found = label && document.getElementById(label.htmlFor);
  if (found instanceof HTMLInputElement || found instanceof HTMLSelectElement) return found;
  throw new Error(`no field is labelled ${name}`);
}
const foundField = (name: string) => waitFor(() => field(name));

/** Hint or error of a field as a screen reader tells it. */
function told(element: HTMLElement): string {
  const ids = (element.getAttribute('aria-describedby') ?? '').split(' ');
  return ids.map((one) => document.getElementById(one)?.textContent ?? '').join(' ');
}

async function enter(name: string, value: string) {
  fireEvent.change(await foundField(name), { target: { value } });
}
const choose = (name: string, value: string) => {
  fireEvent.change(field(name), { target: { value } });
};
const press = (text: string) => {
  fireEvent.click(screen.getByText(text));
};

describe('saving', () => {
  it('sends the whole document with the version it was made from', async () => {
    const { api } = open();
    api.on('PUT /api/scenarios/{id}', ({ body }) => {
      stored = scenario({ ...(body as Partial<ScenarioView>), version: 2, versionId: id(22) });
      return { body: stored };
    });
    await enter('Aperture diameter', '6.5');
    expect(screen.getByText('Unsaved changes')).toBeInTheDocument();
    press('Save as version 2');
    expect(await screen.findByText('Version 2 is saved')).toBeInTheDocument();
    const document = newScenario('coil');
    document.catch.dish.apertureDiameterM = 6.5;
    expect(api.callsOf('PUT /api/scenarios/{id}')[0]?.body).toEqual({
      basedOnVersion: 1,
      name: 'Present coil receiver',
      weatherYearId: id(30),
      document,
    });
  });

  it('stops at fields that only fail together, names them at the field and on top, and sends nothing', async () => {
    const { api } = open();
    await enter('Side of the square face', '4.9');
    press('Save as version 2');
    const summary = (await screen.findByText(/^Not saved: 1 field needs/)).closest('[role="alert"]');
    if (!(summary instanceof HTMLElement)) throw new Error('the summary is not an alert');
    await waitFor(() => {
      expect(summary).toHaveFocus();
    });
    expect(summary).toHaveTextContent('Side of the square face: The receiver is larger than the dish');
    const side = field('Side of the square face');
    expect(told(side)).toMatch(/The receiver is larger than the dish/);
    fireEvent.click(within(summary).getByText('Side of the square face'));
    await waitFor(() => {
      expect(side).toHaveFocus();
    });
    expect(api.callsOf('PUT /api/scenarios/{id}')).toEqual([]);
  });

  it('puts what only the server refused at its field', async () => {
    const { api } = open();
    api.on(
      'PUT /api/scenarios/{id}',
      problem(400, 'Refused', { errors: [{ path: 'document.catch.dish.reflectance', reason: 'not today' }] }),
    );
    await enter('Clean reflectance', '0.8');
    press('Save as version 2');
    await waitFor(() => {
      expect(told(field('Clean reflectance'))).toMatch(/not today/);
    });
    expect(screen.getByText('Unsaved changes')).toBeInTheDocument();
  });

  it('saves over nobody: a newer version is offered, and what was typed stays until it is taken', async () => {
    const { api } = open();
    api.on(
      'PUT /api/scenarios/{id}',
      problem(409, 'Stale', { type: 'urn:noonwell:problem:version-conflict' }),
    );
    await enter('Aperture diameter', '6.5');
    const theirs = newScenario('coil');
    theirs.catch.dish.apertureDiameterM = 7;
    stored = scenario({ version: 2, versionId: id(22), document: theirs });
    press('Save as version 2');
    expect(await screen.findByText(/Somebody has saved a newer version/)).toBeInTheDocument();
    expect(await foundField('Aperture diameter')).toHaveValue('6.5');
    press('Load the newest version');
    await waitFor(() => {
      expect(field('Aperture diameter')).toHaveValue('7');
    });
    expect(screen.getByText('Version 2 is saved')).toBeInTheDocument();
  });
});

describe('fields', () => {
  it('have their unit, range, help and source', async () => {
    open();
    const diameter = await foundField('Aperture diameter');
    expect(told(diameter)).toBe('0.5 to 30 m');
    const sign = diameter.closest('.fui-Field')?.querySelector('button');
    if (!sign) throw new Error('the field has no sign for its help');
    fireEvent.click(sign);
    expect(await screen.findByText(/Outer diameter of the round mirror/)).toBeInTheDocument();
    expect(screen.getByText(/^Source: /)).toBeInTheDocument();
  });

  it('take a row of cells pasted into a list', async () => {
    open();
    const hours = (await screen.findByText('Hot water by hour')).closest('fieldset');
    if (hours === null) throw new Error('the hours are not a fieldset');
    const cell = (name: string) => field(name, hours);
    fireEvent.paste(cell('21–22'), { clipboardData: { getData: () => '5\t6\t7\t8\t9' } });
    // What goes beyond midnight falls off the list's end.
    expect(['20–21', '21–22', '22–23', '23–24'].map((name) => cell(name).value)).toEqual([
      '0',
      '5',
      '6',
      '7',
    ]);
  });

  it('change with the receiver, and what was typed comes back with it', async () => {
    open();
    await enter('Face to water', '25');
    choose('Receiver', 'cell');
    expect(await foundField('Packing')).toHaveValue('0.9');
    expect(
      [...document.querySelectorAll('label')].find(({ textContent }) => textContent === 'Face to water') ??
        null,
    ).toBeNull();
    expect(screen.queryByText(/bare array in the focal plane of a good mirror/)).toBeNull();
    choose('In front of the cells', 'none');
    expect(await screen.findByText(/bare array in the focal plane of a good mirror/)).toBeInTheDocument();
    choose('Receiver', 'coil');
    expect(await foundField('Face to water')).toHaveValue('25');
  });
});

it('can be read and not changed where the study is shared only, with the reason', async () => {
  open({ mayWrite: false, role: 'student' });
  expect(await screen.findByText(/You can read this scenario, not change it/)).toBeInTheDocument();
  expect(await foundField('Aperture diameter')).toHaveAttribute('readonly');
  expect(screen.queryByText(/^Save as/)).toBeNull();
});

it('asks before typed changes are left behind', async () => {
  const { router } = open();
  await enter('Aperture diameter', '6.5');
  fireEvent.click(await screen.findByText('Weather', { selector: 'a' }));
  fireEvent.click(await screen.findByText('Keep it'));
  expect(router.state.location.pathname).toBe(ADDRESS);
  fireEvent.click(await screen.findByText('Weather', { selector: 'a' }));
  fireEvent.click(await screen.findByText('Leave and lose them'));
  await waitFor(() => {
    expect(router.state.location.pathname).toBe('/weather');
  });
});
