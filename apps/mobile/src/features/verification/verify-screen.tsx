import { useLocalSearchParams, useRouter } from 'expo-router';
import { useState } from 'react';
import { ApiProblem } from '../../lib/api-problem.ts';
import { FileDrop } from '../../ui/file-drop.tsx';
import { Button, Form, Loading, Notice, Page, Problem, Row, Stack, Text, TextField } from '../../ui/index.ts';
import { fileHash } from './file-hash.ts';
import { useVerificationQuery } from './verification.api.ts';
import { VerifiedReport } from './verified-report.tsx';

export interface DroppedFile {
  name: string;
  sha256: string;
}

/** Needs no account: shows whether a report is current, and whether a PDF is the very file that was issued. */
export function VerifyScreen() {
  const { code } = useLocalSearchParams<{ code?: string }>();
  const [dropped, setDropped] = useState<DroppedFile | null>(null);
  const [reading, setReading] = useState(false);
  const take = async (file: File) => {
    setReading(true);
    setDropped({ name: file.name, sha256: await fileHash(file) });
    setReading(false);
  };
  const verification = useVerificationQuery(code ?? dropped?.sha256 ?? null);
  return (
    <Page title="Verify a report" narrow>
      <Text>
        Drop the PDF of a report here to see whether it is the very file that was issued, and whether it is still current. Or type the
        verification code that stands at the foot of each of its pages.
      </Text>
      <FileDrop
        label="Drop the PDF here, or choose it"
        hint="It stays in this browser; only its fingerprint (SHA-256) is compared."
        accept="application/pdf,.pdf"
        onFile={(file) => void take(file)}
      />
      <CodeForm key={code ?? ''} code={code ?? ''} />
      <Stack gap={4}>
        {reading || (verification.isPending && verification.fetchStatus !== 'idle') ? <Loading what="the record of the report" /> : null}
        {verification.isError ? (
          <Unknown error={verification.error} dropped={code ? null : dropped} onRetry={verification.refetch} />
        ) : null}
        {verification.data ? <VerifiedReport report={verification.data} dropped={dropped} /> : null}
      </Stack>
    </Page>
  );
}

function CodeForm({ code }: { code: string }) {
  const router = useRouter();
  const [typed, setTyped] = useState(code);
  const open = () => router.push(`/verify/${encodeURIComponent(typed.trim().toUpperCase())}` as '/');
  return (
    <Form onSubmit={open}>
      <TextField
        label="Verification code"
        hint="Four groups of four, such as 7K2M-0QXA-94TD-H6RB"
        value={typed}
        onChange={setTyped}
        figures
        maxLength={40}
        autoComplete="off"
      />
      <Row>
        <Button onPress={open} why={typed.trim() === '' ? 'Type the code first.' : null}>
          Look the code up
        </Button>
      </Row>
    </Form>
  );
}

function Unknown({ error, dropped, onRetry }: { error: unknown; dropped: DroppedFile | null; onRetry: () => unknown }) {
  if (!(error instanceof ApiProblem) || error.kind !== 'not-found') return <Problem error={error} onRetry={onRetry} />;
  return (
    <Notice kind="problem" title={dropped ? 'This file was not issued here' : 'No report has this code'}>
      <Stack gap={2}>
        <Text>
          {dropped
            ? `${dropped.name} is not, byte for byte, a report that was issued here. It may have been changed, printed to a new file, or saved anew by a program. Ask whoever sent it for the original file.`
            : 'Compare it with the code at the foot of the pages. 0 and O, 1 and I are not told apart.'}
        </Text>
        {dropped ? <Text size="note" figures>{`SHA-256 ${dropped.sha256}`}</Text> : null}
      </Stack>
    </Notice>
  );
}
