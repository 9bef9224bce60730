import { Button, makeStyles, mergeClasses, tokens } from '@fluentui/react-components';
import { DocumentAddRegular } from '@fluentui/react-icons';
import { WEATHER_FILE_LIMIT_BYTES, WEATHER_READERS } from '@noonwell/weather';
import { useRef, useState } from 'react';
import { formatQuantity } from '../../shared/format/number.js';

const useStyles = makeStyles({
  root: {
    display: 'grid',
    justifyItems: 'center',
    textAlign: 'center',
    gap: '8px',
    padding: '28px 16px',
    border: `2px dashed ${tokens.colorNeutralStroke1}`,
    borderRadius: tokens.borderRadiusLarge,
    backgroundColor: tokens.colorNeutralBackground1,
  },
  over: {
    border: `2px dashed ${tokens.colorBrandStroke1}`,
    backgroundColor: tokens.colorBrandBackground2,
  },
  text: { margin: 0 },
  note: { margin: 0, color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
});

const MEBIBYTE = 1024 * 1024;

/** A place to drop a weather file, and a button for everybody who does not drag. */
export function DropZone({ onFile }: { onFile: (file: File) => void }) {
  const styles = useStyles();
  const input = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  return (
    <div
      className={mergeClasses(styles.root, over && styles.over)}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => {
        setOver(false);
      }}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        const file = event.dataTransfer.files.item(0);
        if (file !== null) onFile(file);
      }}
    >
      <p className={styles.text}>Drop a weather file here, or</p>
      <Button
        appearance="primary"
        icon={<DocumentAddRegular />}
        onClick={() => {
          input.current?.click();
        }}
      >
        Choose a weather file
      </Button>
      <input
        ref={input}
        type="file"
        hidden
        data-testid="weather-file"
        accept={WEATHER_READERS.flatMap(({ extensions }) => extensions).join(',')}
        onChange={(event) => {
          const file = event.target.files?.item(0) ?? null;
          // The same file can be chosen again after it was mended.
          event.target.value = '';
          if (file !== null) onFile(file);
        }}
      />
      <p className={styles.note}>
        {WEATHER_READERS.map(({ label }) => label).join(', ')}, up to{' '}
        {formatQuantity(WEATHER_FILE_LIMIT_BYTES / MEBIBYTE, 'MiB', 2)}. It is read here first; nothing is
        sent before you say so.
      </p>
    </div>
  );
}
