import { createYearRun } from '@noonwell/engine';
import { serveThread } from './serve-thread';

serveThread(createYearRun);
