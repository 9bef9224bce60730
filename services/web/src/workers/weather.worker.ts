import { expose } from 'comlink';
import { readForPreview } from './read-for-preview.js';

const worker = { readForPreview };
export type WeatherWorker = typeof worker;

expose(worker);
