/** Reads a table of comma-separated values (RFC 4180) apart from the program that wrote it. */
export function readCsv(text: string): Record<string, string>[] {
  const rows: string[][] = [[]];
  for (const match of text.replace(/^\uFEFF/, '').matchAll(/("(?:[^"]|"")*"|[^,\r\n]*)(,|\r\n|$)/g)) {
    const [, cell, end] = match;
    rows.at(-1)!.push(cell!.startsWith('"') ? cell!.slice(1, -1).replace(/""/g, '"') : cell!);
    if (end === '') break;
    if (end === '\r\n') rows.push([]);
  }
  const [heading, ...body] = rows.filter((row) => row.length > 1);
  return body.map((row) => Object.fromEntries(heading!.map((name, index) => [name, row[index]!])));
}
