import { newScenario, type ScenarioView } from '@noonwell/schema';
import { fireEvent, screen, waitFor } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { id, page, scenario, study, weatherYear } from '../../test/fixtures.js';
import { apiFor, renderApp } from '../../test/render-app.js';

let stored: ScenarioView;
beforeEach(() => {
  stored = scenario();
});

function open(mayWrite = true) {
  const api = apiFor('engineer')
    .on('GET /api/studies/{id}', { body: study({ mayWrite }) })
    .on('GET /api/scenarios/{id}', () => ({ body: stored }))
    .on('GET /api/scenarios/{id}/versions', { body: page([]) })
    .on('GET /api/weather-years', { body: page([weatherYear()]) })
    .on('PUT /api/scenarios/{id}', ({ body }) => {
      stored = scenario({ ...(body as Partial<ScenarioView>), version: 2, versionId: id(22) });
      return { body: stored };
    });
  renderApp(`/studies/${id(10)}/scenarios/${id(20)}`);
  return api;
}

// Straight through the attributes, as in the page's other tests: roles of a form of this size take seconds.
const labelled = (label: string) => document.querySelector<HTMLElement>(`[aria-label="${label}"]`);
function cell(label: string): HTMLInputElement {
  const found = labelled(label);
  if (found instanceof HTMLInputElement) return found;
  throw new Error(`no cell is labelled ${label}`);
}
const cells = (column: string) =>
  [...document.querySelectorAll<HTMLInputElement>(`input[aria-label^="${column}, row"]`)].map(
    ({ value }) => value,
  );
/** "Add a row" of the horizon is the first on the page, of the outages the second. */
async function addRow(table: 'horizon' | 'outages') {
  const buttons = await screen.findAllByText('Add a row');
  fireEvent.click(buttons[table === 'horizon' ? 0 : 1]!);
}
const paste = (target: HTMLElement, text: string) => {
  fireEvent.paste(target, { clipboardData: { getData: () => text } });
};
const save = () => {
  fireEvent.click(screen.getByText('Save as version 2'));
};
async function savedDocument(api: ReturnType<typeof open>) {
  await screen.findByText('Version 2 is saved');
  return (api.callsOf('PUT /api/scenarios/{id}')[0]?.body as ScenarioView).document;
}

describe('the horizon profile', () => {
  it('takes cells of a spreadsheet with their heading, and saves them as numbers', async () => {
    const api = open();
    await addRow('horizon');
    paste(cell('Azimuth, row 1'), 'Azimuth\tElevation\n90\t12,5\n180\t3');
    await waitFor(() => {
      expect(cells('Azimuth')).toEqual(['90', '180']);
    });
    expect(screen.getByText('2 rows pasted from row 1 on.')).toBeInTheDocument();
    expect(labelled('Horizon all round, 0 to 12.5° high')).toBeInTheDocument();
    save();
    expect((await savedDocument(api)).place.horizon).toEqual([
      { azimuthDeg: 90, elevationDeg: 12.5 },
      { azimuthDeg: 180, elevationDeg: 3 },
    ]);
  });

  it('reads a file in place of what stood there; a bad one changes nothing and says where it is bad', async () => {
    open();
    await addRow('horizon');
    fireEvent.change(cell('Azimuth, row 1'), { target: { value: '10' } });
    const input = document.querySelector<HTMLInputElement>(
      'input[type="file"][aria-label="Read a CSV file"]',
    )!;
    const choose = (text: string, name: string) => {
      fireEvent.change(input, { target: { files: [new File([text], name, { type: 'text/csv' })] } });
    };
    choose('azimuth;elevation\n0;4\n90;high', 'bad.csv');
    expect(await screen.findByText(/^bad.csv was not read, and nothing was changed. Row 2/)).toHaveAttribute(
      'role',
      'alert',
    );
    expect(cells('Azimuth')).toEqual(['10']);
    choose('azimuth;elevation\n0;4\n90;7,5\n360;4', 'hill.csv');
    expect(await screen.findByText('2 pairs read from hill.csv, in place of what stood here.')).toBeVisible();
    expect(cells('Elevation')).toEqual(['4', '7.5']);
  });

  it('names a direction that stands twice at its cell, and links to it from the top', async () => {
    stored.document.place.horizon = [
      { azimuthDeg: 90, elevationDeg: 5 },
      { azimuthDeg: 180, elevationDeg: 6 },
    ];
    const api = open();
    await screen.findAllByText('Add a row');
    fireEvent.change(cell('Azimuth, row 2'), { target: { value: '90' } });
    save();
    const summary = (await screen.findByText(/^Not saved: 1 field needs/)).closest('[role="alert"]');
    expect(summary).toHaveTextContent('Azimuth: This direction stands already in pair 1');
    expect(cell('Azimuth, row 2')).toHaveAttribute('aria-invalid', 'true');
    fireEvent.click(labelled('Remove row 2')!);
    save();
    expect((await savedDocument(api)).place.horizon).toEqual([{ azimuthDeg: 90, elevationDeg: 5 }]);
  });

  it('is shown but not offered for change to those who may only read', async () => {
    stored.document.place.horizon = [{ azimuthDeg: 90, elevationDeg: 5 }];
    open(false);
    await waitFor(() => {
      expect(cell('Azimuth, row 1')).toHaveAttribute('readonly');
    });
    expect(screen.queryByText('Add a row')).toBeNull();
    expect(labelled('Remove row 1')).toBeNull();
    paste(cell('Azimuth, row 1'), '1\t2\n3\t4');
    expect(cells('Azimuth')).toEqual(['90']);
  });
});

describe('scheduled outages', () => {
  it('saves a range of days, and refuses a day that no year has', async () => {
    const api = open();
    await addRow('outages');
    await waitFor(() => {
      expect(cell('First day, row 1')).toHaveFocus();
    });
    fireEvent.change(cell('First day, row 1'), { target: { value: '03-01' } });
    expect(cell('Last day, row 1')).not.toHaveAttribute('aria-invalid', 'true');
    fireEvent.blur(cell('Last day, row 1'));
    await waitFor(() => {
      expect(cell('Last day, row 1')).toHaveAttribute('aria-invalid', 'true');
    });
    fireEvent.change(cell('Last day, row 1'), { target: { value: '02-30' } });
    save();
    const summary = (await screen.findByText(/^Not saved: 1 field needs/)).closest('[role="alert"]');
    expect(summary).toHaveTextContent('Last day: Last day must be a month and a day that exist');
    fireEvent.change(cell('Last day, row 1'), { target: { value: '03-14' } });
    save();
    const document = newScenario('coil');
    document.catch.outages = [{ from: '03-01', to: '03-14' }];
    expect(await savedDocument(api)).toEqual(document);
  });
});
