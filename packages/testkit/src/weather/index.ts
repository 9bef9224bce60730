export * from './defects.js';
export * from './epw-file.js';
export * from './places.js';
