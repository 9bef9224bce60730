import { tableFromIPC } from 'apache-arrow';
import { ColumnsError, columnKeys, encodeColumns, selectColumns } from './columns.js';

const bytes = encodeColumns([
  { key: 'beamOnAperture', unit: 'W', values: Float64Array.of(0, 1 / 3, 9.81e4) },
  { key: 'faceC', unit: '°C', values: Float64Array.of(-40.25, 20, 81.999999999) },
  { key: 'windMs', unit: 'm/s', values: Float64Array.of(1, 2, 3) },
]);

describe('stored columns', () => {
  it('keep every value exactly, with its unit', () => {
    const table = tableFromIPC(bytes);
    expect(columnKeys(bytes)).toEqual(['beamOnAperture', 'faceC', 'windMs']);
    expect(table.getChild('beamOnAperture')?.toArray()).toEqual(Float64Array.of(0, 1 / 3, 9.81e4));
    expect(table.getChild('faceC')?.toArray()).toEqual(Float64Array.of(-40.25, 20, 81.999999999));
    expect(table.schema.fields.map((field) => field.metadata.get('unit'))).toEqual(['W', '°C', 'm/s']);
  });

  it('give only the columns that are named, in that order', () => {
    const selected = selectColumns(bytes, ['windMs', 'beamOnAperture']);
    expect(columnKeys(selected)).toEqual(['windMs', 'beamOnAperture']);
    expect(tableFromIPC(selected).getChild('windMs')?.toArray()).toEqual(Float64Array.of(1, 2, 3));
    expect(selected.length).toBeLessThan(bytes.length);
  });

  it('refuse a column they do not hold, damaged bytes and columns of different lengths', () => {
    expect(() => selectColumns(bytes, ['faceC', 'moonC'])).toThrow('no column "moonC"');
    expect(() => columnKeys(bytes.subarray(0, 200))).toThrow(ColumnsError);
    expect(() =>
      encodeColumns([
        { key: 'a', unit: '1', values: new Float64Array(2) },
        { key: 'b', unit: '1', values: new Float64Array(3) },
      ]),
    ).toThrow('Column b has 3 values; the others have 2.');
  });
});
