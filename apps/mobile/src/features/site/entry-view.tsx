import type { CampaignDetail } from '@strandnote/api/contract';
import { useRouter } from 'expo-router';
import { useCallback } from 'react';
import { Columns, Loading, Page, Row, Text, useWide } from '../../ui/index.ts';
import { CableList } from './cable-list.tsx';
import { type ChecklistRow, nextToMeasure, progressOf } from './checklist-rows.ts';
import { isBlank } from './entry-draft.ts';
import { entryHref } from './entry-href.ts';
import { EntryMain } from './entry-main.tsx';
import { EntryStatus } from './entry-status.tsx';
import { SaveAction } from './save-action.tsx';
import { useCableKeys } from './use-cable-keys.ts';
import { type EntryPlace, useEntry } from './use-entry.ts';
import { useSaveEntry } from './use-save-entry.ts';

export interface EntryViewProps extends EntryPlace {
  rows: readonly ChecklistRow[];
  /** The campaign as the server holds it. */
  stored: CampaignDetail;
  onReload: () => Promise<unknown>;
  listHref: string;
}

export function EntryView(props: EntryViewProps) {
  const { survey, rows, row, listHref } = props;
  const router = useRouter();
  const wide = useWide();
  const entry = useEntry(props);
  const hrefOf = useCallback((to: ChecklistRow) => entryHref(listHref, to), [listHref]);
  const at = rows.indexOf(row);
  const [previous, following, next] = [rows[at - 1] ?? null, rows[at + 1] ?? null, nextToMeasure(rows, row.key)];
  const goTo = (to: ChecklistRow | null) => router.push((to ? hrefOf(to) : listHref) as '/');
  const saving = useSaveEntry(props, entry, () => goTo(next));
  const filled = entry.draft?.peaks.some((peak) => !isBlank(peak)) ?? false;
  useCableKeys({
    onNext: following && (() => goTo(following)),
    onPrevious: previous && (() => goTo(previous)),
    onSave: filled ? saving.save : null,
  });
  const title = `Cable ${row.name}`;
  const breadcrumb = [{ label: survey.structureName }, { label: survey.name, href: listHref }];
  const { draft, findings } = entry;
  if (!draft || !findings) {
    return (
      <Page title={title} breadcrumb={breadcrumb}>
        <Loading />
      </Page>
    );
  }
  const progress = progressOf(rows);
  const main = (
    <EntryMain
      {...props}
      entry={{ ...entry, draft, findings }}
      saving={saving}
      neighbours={{ previous, following }}
      hrefOf={hrefOf}
      onExcused={() => goTo(next)}
    />
  );
  return (
    <Page
      title={title}
      breadcrumb={breadcrumb}
      status={
        <Row gap={3}>
          <EntryStatus measurementId={draft.measurementId} typed={entry.typed} saved={draft.version > 0} />
          <Text size="note" tone="muted" figures>{`${progress.measured} of ${progress.of}`}</Text>
        </Row>
      }
      actions={
        <SaveAction
          survey={survey}
          filled={filled}
          typed={entry.typed}
          excused={row.entry.notMeasuredReason !== null}
          saving={saving}
          next={next}
          nextHref={next ? hrefOf(next) : listHref}
        />
      }
    >
      {wide ? <Columns shares={[2, 7]}>{[<CableList key="list" rows={rows} currentKey={row.key} hrefOf={hrefOf} />, main]}</Columns> : main}
    </Page>
  );
}
