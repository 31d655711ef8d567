import { v7 as uuidv7 } from 'uuid';

export interface Mail {
  workshopId: string | null;
  recipient: string;
  subject: string;
  body: string;
}

/** Anything that can run a statement inside the transaction that the mail belongs to. */
interface Writer {
  rows(sql: string, parameters: readonly unknown[]): Promise<unknown[]>;
}

/** One line: a break in a subject or an address would start a header of its own. */
function oneLine(text: string): string {
  return text.replaceAll(/[\r\n]+/g, ' ').trim();
}

/** Puts a mail into the outbox, in the same transaction as what it tells of. */
export async function putMail(tx: Writer, { workshopId, recipient, subject, body }: Mail): Promise<void> {
  await tx.rows('insert into outbox_mail (id, workshop_id, recipient, subject, body) values ($1, $2, $3, $4, $5)', [uuidv7(), workshopId, oneLine(recipient), oneLine(subject), body]);
}
