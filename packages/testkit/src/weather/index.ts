export * from './defects.js';
export * from './epw-file.js';
export * from './places.js';
export * from './row-defects.js';
export * from './table-file.js';
export * from './tmy3-file.js';
