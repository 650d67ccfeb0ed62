/** What a new password must be; the same bounds as in the contract. */
export function problemOfNewPassword(password: string): string | null {
  if (password.length < 12) return 'A password has at least 12 characters. A few words in a row are easy to keep in mind.';
  return password.length > 128 ? 'A password has at most 128 characters.' : null;
}
