/** Where in the form a path of the body is entered; null where nobody can change it there. */
export function fieldOfCampaign(path: string): string | null {
  const plain = path.replace(/\[(\d+)\]/g, '.$1');
  const moved: Record<string, string> = {
    'basis.referenceKind': 'referenceKind',
    'basis.lowerLimit': 'below',
    'basis.upperLimit': 'above',
    'basis.decisionRule': 'decisionRule',
    'basis.criticalContact': 'criticalContact',
  };
  if (plain in moved) return moved[plain]!;
  return plain === 'id' || plain.startsWith('basis') ? null : plain;
}
