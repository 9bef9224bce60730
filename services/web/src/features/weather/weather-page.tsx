import { ROLE_LABELS } from '@noonwell/schema';
import { useEffect } from 'react';
import { useMay, useMe } from '../../shared/api/me.js';
import { PageHeader } from '../../shared/components/page-header.js';
import { AcceptancePanel } from './acceptance-panel.js';
import { WeatherList } from './weather-list.js';

export default function WeatherPage() {
  const me = useMe();
  const mayAdd = useMay('weather.write');
  useKeepDroppedFiles();
  return (
    <>
      <PageHeader
        title="Weather"
        below={
          mayAdd
            ? 'A year of sun, air and wind at one place, hour by hour. Every run needs one.'
            : `A year of sun, air and wind at one place. As a ${ROLE_LABELS[me.role].toLowerCase()} you use the years that others added.`
        }
      />
      {mayAdd && <AcceptancePanel />}
      <WeatherList mayAdd={mayAdd} />
    </>
  );
}

/** A file dropped beside the drop zone would make the browser leave the app for it. */
function useKeepDroppedFiles() {
  useEffect(() => {
    const keep = (event: DragEvent) => {
      event.preventDefault();
    };
    window.addEventListener('dragover', keep);
    window.addEventListener('drop', keep);
    return () => {
      window.removeEventListener('dragover', keep);
      window.removeEventListener('drop', keep);
    };
  }, []);
}
