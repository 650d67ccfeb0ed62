/** A message to one person. */
export interface Mail {
  to: string;
  subject: string;
  text: string;
  /** Where in the firm it leads: "reports/…"; the address is put together when it is sent. */
  path?: string;
}
