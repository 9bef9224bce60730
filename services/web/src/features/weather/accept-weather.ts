import { nameSchema, weatherYearSchema, type WeatherYearView } from '@noonwell/schema';
import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useReducer, useRef } from 'react';
import { upload } from '../../shared/api/upload.js';
import { WEATHER_KEY, weatherYearQuery } from '../../shared/api/weather-years.js';
import type { WeatherPreview } from '../../workers/read-for-preview.js';
import { readInWorker } from './read-in-worker.js';

/** Where a dropped file stands on its way to a weather year. */
export type Acceptance =
  | { readonly step: 'none' }
  | { readonly step: 'reading'; readonly file: File; readonly fraction: number }
  | { readonly step: 'unreadable'; readonly file: File; readonly error: unknown }
  | { readonly step: 'read'; readonly file: File; readonly preview: WeatherPreview; readonly error: unknown }
  | {
      readonly step: 'sending';
      readonly file: File;
      readonly preview: WeatherPreview;
      /** 1: all sent, the server is reading it. */
      readonly fraction: number;
    }
  | { readonly step: 'accepted'; readonly file: File; readonly year: WeatherYearView };

type Event =
  | { type: 'reset' }
  | { type: 'dropped'; file: File }
  | { type: 'progress'; fraction: number }
  | { type: 'read'; preview: WeatherPreview }
  | { type: 'unreadable'; error: unknown }
  | { type: 'send' }
  | { type: 'refused'; error: unknown }
  | { type: 'accepted'; year: WeatherYearView };

function reduce(state: Acceptance, event: Event): Acceptance {
  switch (event.type) {
    case 'reset':
      return { step: 'none' };
    case 'dropped':
      return { step: 'reading', file: event.file, fraction: 0 };
    case 'progress':
      return 'fraction' in state ? { ...state, fraction: event.fraction } : state;
    case 'read':
      return state.step === 'reading'
        ? { step: 'read', file: state.file, preview: event.preview, error: null }
        : state;
    case 'unreadable':
      return state.step === 'reading' ? { step: 'unreadable', file: state.file, error: event.error } : state;
    case 'send':
      return state.step === 'read'
        ? { step: 'sending', file: state.file, preview: state.preview, fraction: 0 }
        : state;
    case 'refused':
      return state.step === 'sending'
        ? { step: 'read', file: state.file, preview: state.preview, error: event.error }
        : state;
    case 'accepted':
      return state.step === 'sending' ? { step: 'accepted', file: state.file, year: event.year } : state;
  }
}

/** Reads a file in the browser, sends it on request, and can be stopped at every step. */
export function useWeatherAcceptance() {
  const client = useQueryClient();
  const [state, dispatch] = useReducer(reduce, { step: 'none' });
  const running = useRef<AbortController | null>(null);
  useEffect(() => () => running.current?.abort(), []);

  const begin = useCallback(() => {
    running.current?.abort();
    const controller = new AbortController();
    running.current = controller;
    return controller.signal;
  }, []);

  const onFile = useCallback(
    async (file: File) => {
      const signal = begin();
      dispatch({ type: 'dropped', file });
      try {
        const preview = await readInWorker(
          file,
          (fraction) => {
            if (!signal.aborted) dispatch({ type: 'progress', fraction });
          },
          signal,
        );
        if (!signal.aborted) dispatch({ type: 'read', preview });
      } catch (error) {
        if (!signal.aborted) dispatch({ type: 'unreadable', error });
      }
    },
    [begin],
  );

  const onSend = useCallback(
    async (file: File, name: string) => {
      const signal = begin();
      dispatch({ type: 'send' });
      const form = new FormData();
      // Text first: a server that reads the form as it comes knows the name before the file.
      if (nameSchema.safeParse(name).success) form.append('name', name.trim());
      form.append('file', file, file.name);
      try {
        const year = await upload('POST /api/weather-years', weatherYearSchema, form, {
          signal,
          onProgress: (fraction) => {
            dispatch({ type: 'progress', fraction });
          },
        });
        client.setQueryData(weatherYearQuery(year.id).queryKey, year);
        void client.invalidateQueries({ queryKey: [...WEATHER_KEY, 'list'] });
        if (!signal.aborted) dispatch({ type: 'accepted', year });
      } catch (error) {
        if (!signal.aborted) dispatch({ type: 'refused', error });
      }
    },
    [begin, client],
  );

  const onReset = useCallback(() => {
    running.current?.abort();
    dispatch({ type: 'reset' });
  }, []);

  return { state, onFile, onSend, onReset };
}
