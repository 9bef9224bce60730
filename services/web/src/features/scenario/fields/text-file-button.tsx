import { Button } from '@fluentui/react-components';
import { DocumentTableRegular } from '@fluentui/react-icons';
import { useRef } from 'react';

/** A table of a few hundred rows is a few kilobytes; anything larger is another file. */
const LIMIT_BYTES = 1024 * 1024;

interface TextFileButtonProps {
  label: string;
  onText: (text: string, fileName: string) => void;
  onProblem: (sentence: string) => void;
}

/** Reads a small text file that the user picks. */
export function TextFileButton({ label, onText, onProblem }: TextFileButtonProps) {
  const input = useRef<HTMLInputElement>(null);

  const read = async (file: File) => {
    if (file.size > LIMIT_BYTES) {
      onProblem(`${file.name} was not read: it has ${file.size} bytes, which no such table has.`);
      return;
    }
    try {
      onText(await file.text(), file.name);
    } catch {
      onProblem(`${file.name} could not be read. Choose it again, or paste its rows.`);
    }
  };

  return (
    <>
      <Button
        size="small"
        icon={<DocumentTableRegular />}
        onClick={() => {
          input.current?.click();
        }}
      >
        {label}
      </Button>
      <input
        ref={input}
        type="file"
        accept=".csv,.txt,.tsv,text/csv,text/plain"
        hidden
        aria-label={label}
        onChange={({ currentTarget }) => {
          const [file] = currentTarget.files ?? [];
          // The same file can be chosen again after it was corrected.
          currentTarget.value = '';
          if (file) void read(file);
        }}
      />
    </>
  );
}
