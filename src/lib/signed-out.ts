/** Tells, by the event `refused`, that the server no longer knows who is asking. */
export const signedOut = new EventTarget();

export function saySignedOut(): void {
  signedOut.dispatchEvent(new Event('refused'));
}
