import type { AuditVerification } from '@strandnote/api/contract';
import { useFirm } from '../../lib/session.tsx';
import { Button, Notice, Problem, Row, Stack, Text } from '../../ui/index.ts';
import { useVerifyAuditMutation } from './firm.api.ts';

/** Each event seals the one before it: recomputing shows whether any was changed, cut out or put in. */
export function VerifyChain() {
  const firm = useFirm();
  const verify = useVerifyAuditMutation(firm.firmId);
  return (
    <Stack gap={3}>
      <Row>
        <Button onPress={() => verify.mutate()} busy={verify.isPending}>
          Verify the chain
        </Button>
      </Row>
      {verify.isError ? <Problem error={verify.error} /> : null}
      {verify.data && !verify.isPending ? <Outcome outcome={verify.data} /> : null}
    </Stack>
  );
}

function Outcome({ outcome: { events, intact, head, firstProblem } }: { outcome: AuditVerification }) {
  const count = events === 1 ? '1 event' : `${events} events`;
  if (intact) {
    return (
      <>
        <Notice title="The chain is intact" alert>
          {`${count} recomputed; every one follows from the one before, and the anchors outside the database agree.`}
        </Notice>
        <Text size="note" tone="muted">
          {`Head ${head}`}
        </Text>
      </>
    );
  }
  return (
    <Notice kind="problem" title="The chain is not intact" alert>
      {firstProblem ? `First problem, at event ${firstProblem.sequence} of ${events}: ${firstProblem.message}` : `${count} recomputed.`}
    </Notice>
  );
}
