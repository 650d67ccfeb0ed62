import type { ReactNode } from 'react';
import { hairline, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';

export interface Definition {
  term: string;
  value: ReactNode;
  /** Where the value comes from, or what qualifies it. */
  note?: string;
  figures?: boolean;
}

/** Names and values, a hairline between: properties of a cable, conditions of a campaign. */
export function Definitions({ items }: { items: Definition[] }) {
  const { line } = useColours();
  return (
    <dl style={{ margin: 0, display: 'flex', flexDirection: 'column' }}>
      {items.map((item, index) => (
        <div
          key={item.term}
          style={{
            display: 'flex',
            flexWrap: 'wrap',
            justifyContent: 'space-between',
            gap: `${space(1)}px ${space(4)}px`,
            padding: `${space(2)}px 0`,
            borderTop: index === 0 ? undefined : `${hairline}px solid ${line}`,
          }}
        >
          <dt style={{ flex: '1 1 120px' }}>
            <Text tone="muted">{item.term}</Text>
          </dt>
          <dd style={{ margin: 0, flex: '1 1 140px', minWidth: 0, display: 'flex', flexDirection: 'column', alignItems: 'flex-end' }}>
            <DefinitionValue item={item} />
          </dd>
        </div>
      ))}
    </dl>
  );
}

function DefinitionValue({ item }: { item: Definition }) {
  const plain = typeof item.value === 'string' || typeof item.value === 'number';
  return (
    <>
      {plain ? (
        <Text figures={item.figures} align="right">
          {item.value}
        </Text>
      ) : (
        item.value
      )}
      {item.note ? (
        <Text size="note" tone="muted" align="right">
          {item.note}
        </Text>
      ) : null}
    </>
  );
}
