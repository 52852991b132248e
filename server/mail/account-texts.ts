import type { Mail } from '@/server/mail/mailer';

/** Hours that a link in a mail stays good. */
export const CONFIRM_HOURS = 48;
export const RESET_HOURS = 2;

interface Addressee {
  name: string;
  email: string;
}

const signature = '\n\nRitornel, a checked archive of periodic orbits\n';

/** Mail with the link that confirms an address. */
export const confirmAddressMail = (to: Addressee, publicUrl: string, token: string): Mail => ({
  to: to.email,
  subject: 'Confirm your address',
  text: `Hello ${to.name},

somebody, hopefully you, registered this address with Ritornel. This link confirms it and makes the account ready to submit orbits:

${publicUrl}/confirm?token=${token}

The link works once, for ${CONFIRM_HOURS} hours. If you did not register, leave it: nothing happens without it.${signature}`,
});

/** Mail to somebody who registers an address that has an account. */
export const alreadyRegisteredMail = (to: Addressee, publicUrl: string): Mail => ({
  to: to.email,
  subject: 'You have an account already',
  text: `Hello ${to.name},

somebody, hopefully you, registered this address with Ritornel, but it has an account already. Nothing was changed.

Sign in: ${publicUrl}/account/sign-in
New password: ${publicUrl}/account/forgot${signature}`,
});

/** Mail with the link that sets a new password. */
export const resetPasswordMail = (to: Addressee, publicUrl: string, token: string): Mail => ({
  to: to.email,
  subject: 'Set a new password',
  text: `Hello ${to.name},

this link sets a new password for your account:

${publicUrl}/reset?token=${token}

The link works once, for ${RESET_HOURS} hours. If you did not ask for it, leave it: your password stays as it is.${signature}`,
});

/** Mail that says that a password was changed, so that its owner notices when it was somebody else. */
export const passwordChangedMail = (to: Addressee, publicUrl: string): Mail => ({
  to: to.email,
  subject: 'Your password was changed',
  text: `Hello ${to.name},

the password of your account was changed and every sign-in was ended. If that was not you, set a new one now:

${publicUrl}/account/forgot${signature}`,
});
