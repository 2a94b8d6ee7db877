/** One e-mail, ready to go: plain text and HTML say the same. */
export interface Letter {
  to: string;
  subject: string;
  text: string;
  html: string;
}
