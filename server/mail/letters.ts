/** A mail's words. Plain text: there is no markup that a name could break out of. */
export interface Letter {
  subject: string;
  body: string;
}

/**
 * A name typed by somebody, fit for a mail: one line, short, and nothing that a mail program would
 * turn into a link. Otherwise a workshop's name could carry a stranger's address under our letterhead.
 */
export function plainName(name: string): string {
  return name
    .replaceAll(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+/gu, ' ')
    .replaceAll(/[:/\\@<>]+/g, ' ')
    .replaceAll(/\.(?=\S)/g, '. ')
    .replaceAll(/\s+/g, ' ')
    .trim()
    .slice(0, 80);
}

const asRole = { owner: 'owner', maker: 'maker', inspector: 'inspector', viewer: 'a member who reads only' } as const;

export function invitationLetter(publicUrl: string, { token, from, workshop, name, role, days }: { token: string; from: string; workshop: string; name: string; role: keyof typeof asRole; days: number }): Letter {
  return {
    subject: `${plainName(from)} invites you to ${plainName(workshop)}`,
    body: `Hello ${plainName(name)},\n\n${plainName(from)} invites you to join ${plainName(workshop)} on Loafmark as ${asRole[role]}.\nThis link works once, for ${days} days:\n\n${publicUrl}/invitation/${token}\n\nIf you do not know the workshop, do nothing.`,
  };
}

export function resetLetter(publicUrl: string, { token, minutes }: { token: string; minutes: number }): Letter {
  return {
    subject: 'Set a new password',
    body: `This link sets a new password for Loafmark. It works once, for ${minutes} minutes:\n\n${publicUrl}/reset?token=${token}\n\nIf you did not ask for it, do nothing; your password stays as it is.`,
  };
}

export function passwordChangedLetter(publicUrl: string): Letter {
  return {
    subject: 'Your password was changed',
    body: `The password of your Loafmark account was changed, and every other session of yours ended.\n\nIf that was not you, set a new one at once:\n\n${publicUrl}/reset`,
  };
}

export function knownAddressLetter(publicUrl: string): Letter {
  return {
    subject: 'You already have an account',
    body: `Somebody, perhaps you, tried to sign up with this address. You have an account already, and nothing was changed.\n\nSign in:\n\n${publicUrl}/sign-in\n\nForgotten password:\n\n${publicUrl}/reset`,
  };
}

export function welcomeLetter(publicUrl: string, { workshopName, name }: { workshopName: string; name: string }): Letter {
  return {
    subject: `${plainName(workshopName)} is ready`,
    body: `Hello ${plainName(name)},\n\nyour workshop ${plainName(workshopName)} is ready, and you are its owner.\n\n${publicUrl}/sign-in\n\nIf you did not sign up, somebody typed your address by mistake; set a password of your own at ${publicUrl}/reset and the account is yours alone.`,
  };
}

export function secondWorkshopLetter(publicUrl: string, { workshopName }: { workshopName: string }): Letter {
  return {
    subject: `${plainName(workshopName)} is ready`,
    body: `Your account has a further workshop, ${plainName(workshopName)}. You change between workshops under My settings.\n\n${publicUrl}/sign-in`,
  };
}
