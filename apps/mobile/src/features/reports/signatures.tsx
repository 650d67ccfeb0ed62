import type { Signature } from '@strandnote/api/contract';
import { showTime } from '../../lib/show-time.ts';
import { Definitions, Heading, Stack } from '../../ui/index.ts';

/** Who signed what, when, and for which content. */
export function Signatures({ signatures, timeZone }: { signatures: readonly Signature[]; timeZone: string }) {
  if (signatures.length === 0) return null;
  return (
    <Stack gap={2}>
      <Heading level={2}>Signatures</Heading>
      <Definitions
        items={signatures.map((signature) => ({
          term: signature.meaning,
          value: [signature.name, signature.licenceNumber, signature.jurisdiction].filter((part) => part !== '').join(', '),
          note: `${showTime(signature.signedAt, timeZone)}, content ${signature.contentSha256.slice(0, 12)}…`,
        }))}
      />
    </Stack>
  );
}
