import type { Revision } from '@strandnote/api/contract';
import type { ReportTexts } from '@strandnote/core/report-content';
import { useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { useKeptText } from '../../lib/use-kept-text.ts';
import { Button, Heading, Notice, Row, Stack, Text, TextField } from '../../ui/index.ts';
import { useEditRevisionMutation } from './reports.api.ts';

const fields: { name: keyof ReportTexts; label: string; hint: string }[] = [
  { name: 'scope', label: 'Scope', hint: 'What was asked for, and which cables were surveyed.' },
  { name: 'conditions', label: 'Conditions', hint: 'Weather, traffic, stage, and whatever else bore on the survey.' },
  { name: 'deviations', label: 'Deviations', hint: 'From what was agreed; write that there were none if so.' },
  { name: 'conclusion', label: 'Conclusion', hint: 'What the intervals show against the agreed limits, and what they cannot show.' },
];

/** The report's few texts: typed while it is a draft, read afterwards. What is typed is kept on this device until it is saved. */
export function RevisionTexts({ revision }: { revision: Revision }) {
  return (
    <Stack gap={3}>
      <Heading level={2}>Texts</Heading>
      {revision.may.edit === null ? <TextsForm revision={revision} /> : <RevisionTextsRead texts={revision.texts} />}
    </Stack>
  );
}

export function RevisionTextsRead({ texts }: { texts: ReportTexts }) {
  return (
    <Stack gap={3}>
      {fields.map(({ name, label }) => (
        <Stack key={name} gap={1}>
          <Heading level={3}>{label}</Heading>
          <Text>{texts[name] || 'Nothing written.'}</Text>
        </Stack>
      ))}
    </Stack>
  );
}

function TextsForm({ revision }: { revision: Revision }) {
  const firm = useFirm();
  const edit = useEditRevisionMutation(firm.firmId, revision.id);
  const kept = useKeptText<ReportTexts>(`revision ${revision.id} ${revision.textVersion}`, revision.texts);
  const [saved, setSaved] = useState(false);
  const changed = fields.some(({ name }) => kept.value[name] !== revision.texts[name]);
  const save = () =>
    edit.mutate(
      { texts: kept.value, deputyUserId: revision.deputyUserId, textVersion: revision.textVersion },
      {
        onSuccess: () => {
          kept.forget();
          setSaved(true);
        },
      },
    );
  return (
    <Stack gap={4}>
      {fields.map(({ name, label, hint }) => (
        <TextField
          key={name}
          label={label}
          hint={hint}
          rows={4}
          maxLength={4000}
          value={kept.value[name]}
          onChange={(text) => {
            setSaved(false);
            kept.change({ ...kept.value, [name]: text });
          }}
        />
      ))}
      {edit.isError ? <Notice kind="problem">{edit.error.message}</Notice> : null}
      <Row>
        <Button onPress={save} busy={edit.isPending} why={changed ? null : saved ? 'Saved.' : 'Nothing has changed.'}>
          Save the texts
        </Button>
      </Row>
    </Stack>
  );
}
