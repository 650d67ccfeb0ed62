import type { Revision } from '@strandnote/api/contract';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm, useMeQuery } from '../../lib/session.tsx';
import { Button, Form, FormCheckbox, FormPasswordField, FormTextField, Notice, Sheet, Stack, Text } from '../../ui/index.ts';
import { useApproveMutation } from '../reports/reports.api.ts';

interface Values {
  name: string;
  licenceNumber: string;
  jurisdiction: string;
  meaningUnderstood: boolean;
  password: string;
}

/** "Checked and approved": what the signature means is spelled out before it is given, for the content under one hash. */
export function ApproveSheet({ revision, onClose }: { revision: Revision; onClose: () => void }) {
  const firm = useFirm();
  const me = useMeQuery();
  const approve = useApproveMutation(firm.firmId, revision.id);
  const form = useForm<Values>({
    defaultValues: {
      name: me.data?.name ?? '',
      licenceNumber: firm.licenceNumber,
      jurisdiction: firm.licenceJurisdiction,
      meaningUnderstood: false,
      password: '',
    },
  });
  const sign = form.handleSubmit(async (values) => {
    try {
      await approve.mutateAsync({ ...values, meaningUnderstood: true, contentSha256: revision.contentSha256 });
      onClose();
    } catch (error) {
      showProblem(form, error);
    }
  });
  const filled = (what: string) => (text: string) => (text.trim() === '' ? `Type ${what}.` : null);
  return (
    <Sheet
      title={`Approve revision ${revision.letter}`}
      onClose={onClose}
      holds
      actions={
        <Button kind="primary" onPress={sign} busy={approve.isPending}>
          Sign: checked and approved
        </Button>
      }
    >
      <Form onSubmit={sign}>
        <Stack>
          <Text>{revision.statements.checked}</Text>
          <Text size="note" tone="muted">{`Content hash ${revision.contentSha256}`}</Text>
          <FormCheckbox
            control={form.control}
            name="meaningUnderstood"
            label="This is what I sign"
            check={(value) => (value ? null : 'Confirm what the signature means.')}
          />
          <FormTextField
            control={form.control}
            name="name"
            label="Name, as it is to be printed"
            autoComplete="name"
            check={filled('your name')}
          />
          <FormTextField control={form.control} name="licenceNumber" label="Licence number" check={filled('your licence number')} />
          <FormTextField
            control={form.control}
            name="jurisdiction"
            label="Jurisdiction of the licence"
            check={filled('where you are licensed')}
          />
          <FormPasswordField
            control={form.control}
            name="password"
            label="Your password"
            purpose="current-password"
            check={filled('your password to sign')}
          />
          {form.formState.errors.root ? <Notice kind="problem">{form.formState.errors.root.message}</Notice> : null}
        </Stack>
      </Form>
    </Sheet>
  );
}
