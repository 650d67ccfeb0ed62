import type { AuditEvent } from '@strandnote/api/contract';

/** What was done, read after the name of who did it. An act that is not here is shown by its own name. */
const acts: Record<string, string> = {
  'firm.changed': 'changed the firm',
  'member.invited': 'invited a person',
  'member.joined': 'joined the firm',
  'member.changed': 'changed a person’s entry',
  'invitation.revoked': 'revoked an invitation',
  'session.started': 'signed in',
  'session.ended': 'signed out',
  'password.changed': 'changed the password',
  'password.reset': 'reset the password',
  'client.created': 'added a client',
  'client.changed': 'changed a client',
  'structure.created': 'added a structure',
  'structure.changed': 'changed a structure',
  'section.created': 'added a section',
  'section.changed': 'changed a section',
  'cable.created': 'added a cable',
  'cable.changed': 'changed a cable',
  'reference.created': 'added a reference tension',
  'reference.retired': 'retired a reference tension',
  'campaign.created': 'created a campaign',
  'campaign.edited': 'changed a campaign',
  'cable.excused': 'noted a cable as not measured',
  'cable.excuse-withdrawn': 'put a cable back to be measured',
  'measurement.entered': 'entered a measurement',
  'measurement.changed': 'changed a measurement',
  'estimates.saved': 'saved estimates',
  'report.created': 'started a report',
  'revision.started': 'started a revision',
  'revision.edited': 'edited a revision',
  'revision.submitted': 'submitted a revision',
  'revision.recalled': 'recalled a revision',
  'revision.returned': 'returned a revision',
  'revision.approved': 'approved a revision',
  'revision.rendered': 'made the PDF of a revision',
  'revision.issued': 'issued a revision',
  'revision.withdrawn': 'withdrew a revision',
  'cable.ticked': 'ticked a cable as checked',
  'cable.unticked': 'took back the tick of a cable',
  'remark.made': 'made a remark',
  'remark.answered': 'answered a remark',
  'remark.closed': 'closed a remark',
  'remark.reopened': 'opened a remark again',
  'report.downloaded': 'downloaded a report',
  'results.downloaded': 'downloaded the results of a report',
  'content.downloaded': 'downloaded the content of a report',
};

export function actText({ act }: Pick<AuditEvent, 'act'>): string {
  return acts[act] ?? act;
}

/** Pages of what an event is about, below the address of the firm. */
const places: Record<string, (id: string) => string> = {
  firm: () => 'firm',
  member: () => 'firm/members',
  invitation: () => 'firm/members',
  client: () => 'clients',
  structure: (id) => `structures/${id}`,
  cable: (id) => `structures/cables/${id}`,
  campaign: (id) => `site/${id}`,
  revision: (id) => `reports/${id}`,
};

/** Where the subject of an event is looked at; null for what has no page of its own. */
export function subjectPath({ subjectKind, subjectId }: Pick<AuditEvent, 'subjectKind' | 'subjectId'>): string | null {
  return places[subjectKind]?.(subjectId) ?? null;
}

/** Their details hold another name than the subject's: the signer's, or the file's. */
const namesAnother = /^revision\.approved$|\.downloaded$/;

/** The name that an event itself gives its subject, the new one where it changed. */
export function nameInDetails({ act, details }: Pick<AuditEvent, 'act' | 'details'>): string | null {
  if (namesAnother.test(act)) return null;
  const { name, reference, number, letter, email } = isRecord(details.to) ? details.to : details;
  if (typeof number === 'string') return typeof letter === 'string' ? `${number}, revision ${letter}` : number;
  const named = [name, reference, email].find((value) => typeof value === 'string');
  return typeof named === 'string' ? named : null;
}

/** "structure Long Ferry Bridge", or the kind alone where no name is known. */
export function subjectText(event: AuditEvent, names: ReadonlyMap<string, string>): string {
  const kind = event.subjectKind.replaceAll('-', ' ');
  const name = nameInDetails(event) ?? names.get(event.subjectId);
  return name === undefined ? kind : `${kind} ${name}`;
}

/** Keys and hashes say nothing to a reader; they stay in the trail. */
const unreadable = /^([0-9a-f]{64}|[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12})$/;

/** What the event says beyond its act: values given, or old and new ones. */
export function detailsText({ details }: Pick<AuditEvent, 'details'>): string {
  const { from, to, ...given } = details;
  if (isRecord(from) && isRecord(to)) {
    const changes = Object.keys(to).map((key) => `${words(key)}: ${valueText(from[key]) || 'empty'} to ${valueText(to[key]) || 'empty'}`);
    return changes.join('; ');
  }
  const all = typeof from === 'string' ? { ...given, from } : given;
  return Object.entries(all)
    .map(([key, value]) => [words(key), valueText(value)])
    .filter(([, value]) => value !== '')
    .map(([key, value]) => `${key}: ${value}`)
    .join('; ');
}

function valueText(value: unknown): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return unreadable.test(value) ? '' : value;
  if (typeof value === 'number') return String(value);
  if (Array.isArray(value)) return value.map(valueText).filter(Boolean).join(', ');
  return Object.entries(value)
    .map(([key, held]) => [words(key), valueText(held)])
    .filter(([, held]) => held !== '')
    .map(([key, held]) => `${key} ${held}`)
    .join(', ');
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** "licenceNumber" as "licence number". */
function words(key: string): string {
  return key.replaceAll(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}
