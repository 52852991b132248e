import type { Handler } from 'express';
import { Passport } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import { User } from '@/server/models/user';
import { checkPassword } from '@/server/services/check-password';

export interface SignIn {
  /** Puts the account of the session's cookie into `req.user`. */
  restore: Handler;
  /** Checks `{ email, password }` of the body and begins a new session. */
  begin: Handler;
}

/** Passport for one application: no state is shared with any other. */
export function signInStrategy(): SignIn {
  const passport = new Passport();
  passport.use(
    new LocalStrategy({ usernameField: 'email', passwordField: 'password' }, (email, password, done) => {
      checkPassword(email, password).then((user) => done(null, user), done);
    }),
  );
  passport.serializeUser((user, done) => done(null, user.id));
  passport.deserializeUser((id: string, done) => {
    User.findByPk(id).then((user) => done(null, user ?? false), done);
  });
  return {
    restore: passport.session() as Handler,
    begin: passport.authenticate('local') as Handler,
  };
}
