import { useId, useState } from 'react';
import { View } from 'react-native';
import { radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';

export interface FileDropProps {
  label: string;
  hint?: string;
  /** What the file chooser offers: "application/pdf". */
  accept: string;
  onFile: (file: File) => void;
}

/** A place to drop a file on, or to choose one by key or touch. The file stays in the browser. */
export function FileDrop({ label, hint, accept, onFile }: FileDropProps) {
  const colours = useColours();
  const id = useId();
  const [over, setOver] = useState(false);
  const take = (files: FileList | null) => {
    const file = files?.item(0);
    if (file) onFile(file);
  };
  return (
    <label
      htmlFor={id}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        take(event.dataTransfer.files);
      }}
      style={{
        display: 'block',
        padding: space(6),
        borderRadius: radius,
        border: `1.5px dashed ${colours.verdigris}`,
        background: over ? colours.wash : colours.sheet,
        cursor: 'pointer',
      }}
    >
      <View style={{ gap: space(2), alignItems: 'center' }}>
        <Text strong tone="verdigris" align="center">
          {label}
        </Text>
        {hint ? (
          <Text size="note" tone={over ? 'ink' : 'muted'} align="center">
            {hint}
          </Text>
        ) : null}
        <input
          id={id}
          type="file"
          accept={accept}
          aria-label={label}
          onChange={(event) => {
            take(event.target.files);
            event.target.value = '';
          }}
          style={{ color: colours.ink, font: 'inherit', maxWidth: '100%', minHeight: 44 }}
        />
      </View>
    </label>
  );
}
